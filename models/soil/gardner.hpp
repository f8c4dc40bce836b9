#pragma once
/// Gardner's exponential curves, with saturation of the same form, so that the diffusivity is
/// constant and the flow equation is linear in K:
///
///   Kr = Se = exp(alpha h)   h < 0, else 1
///
/// The flux potential is exp(alpha h) / alpha, the capillary length exactly 1 / alpha.
///
/// @source Gardner 1958, Soil Sci. 85:228 (conductivity)
/// @checked tests/models/soil/curves_test.cpp

#include "models/soil/curves.hpp"

namespace ringwright::models {

class Gardner final : public Curves {
 public:
  /// @param alpha [1/m], > 0 @throws std::invalid_argument otherwise
  explicit Gardner(double alpha);

  double saturation(double h) const override;
  double saturation_slope(double h) const override;
  double relative_conductivity(double h) const override { return saturation(h); }
  double relative_conductivity_slope(double h) const override { return saturation_slope(h); }
  double entry_head() const override { return 0.0; }
  double steepest_head() const override { return 0.0; }
  double head_at(double Se) const override;
  double relative_flux_potential(double h) const override;
  std::string describe() const override;

  double alpha() const { return alpha_; }

 private:
  double alpha_;
};

}  // namespace ringwright::models
