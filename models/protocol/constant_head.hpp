#pragma once
#include <optional>

namespace ringwright::models {

/// "n readings within a fraction": the test ends when the last `readings` rates differ
/// from their mean by less than `within`.
struct StopWhenSteady {
  int readings = 3;
  double within = 0.05;  ///< [-]
};

/// A constant head held in the ring from time 0.
struct ConstantHead {
  double head = 0.0;                       ///< depth H of the pond [m]
  double longest = 0.0;                    ///< the test ends here at the latest [s]
  std::optional<double> reading_interval;  ///< [s]; none: max(60 s, 5 % of longest)
  std::optional<StopWhenSteady> stop;      ///< none: runs to `longest`
};

}  // namespace ringwright::models
