#pragma once
/// What happens on a boundary patch, face by face.

#include <functional>

namespace ringwright::solver {

enum class Boundary {
  closed,         ///< no flow
  head,           ///< pressure head given [m], negative too
  flux,           ///< volume flux into the soil given [m/s]
  free_drainage,  ///< unit gradient: flux out = K
  seepage,        ///< open to the air: closed while h < 0, at h = 0 while water comes out
  pond            ///< under water whose level is an unknown (pond.hpp)
};

/// A condition; `value` is evaluated at (time [s], position along the patch [m]).
struct Condition {
  Boundary kind = Boundary::closed;
  std::function<double(double time, double position)> value = {};
  bool varies_in_time = false;  ///< value must be smooth within one leg of the integration

  static Condition constant(Boundary kind, double value) {
    return {kind, [value](double, double) { return value; }, false};
  }
};

}  // namespace ringwright::solver
