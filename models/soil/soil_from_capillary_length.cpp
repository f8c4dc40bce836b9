#include "models/soil/soil_from_capillary_length.hpp"

#include <cmath>
#include <memory>
#include <stdexcept>

#include "models/soil/capillary_length.hpp"
#include "models/soil/gardner.hpp"

namespace ringwright::models {

Soil soil_from_capillary_length(double capillary_length, double fillable_porosity, double Ks,
                                double h_i) {
  if (!(capillary_length > 0.0)) throw std::invalid_argument("capillary length must be above 0");
  if (!(fillable_porosity > 0.0)) throw std::invalid_argument("fillable porosity must be above 0");
  if (!(Ks > 0.0)) throw std::invalid_argument("conductivity must be above 0");
  if (!(h_i < 0.0)) throw std::invalid_argument("the initial head must be below 0");
  const double theta_s = fillable_porosity / -std::expm1(h_i / capillary_length);
  if (theta_s >= 1.0) {
    throw std::invalid_argument("the start is too wet for so much fillable porosity");
  }
  return {std::make_shared<Gardner>(1.0 / capillary_length), 0.0, theta_s, Ks, 0.0};
}

Soil matched_gardner(const Soil& soil, double h_i) {
  const double lambda = capillary_length(*soil.curves, h_i);
  // theta_r such that theta(h_i) stays: (theta_s - theta_r)(1 - exp(h_i/lambda)) = filled pores
  const double filled = soil.theta_s - soil.water_content(h_i);
  const double theta_r = soil.theta_s - filled / -std::expm1(h_i / lambda);
  return {std::make_shared<Gardner>(1.0 / lambda), theta_r, soil.theta_s, soil.Ks,
          soil.specific_storage};
}

}  // namespace ringwright::models
