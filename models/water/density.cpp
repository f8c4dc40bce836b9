#include "models/water/density.hpp"

#include <stdexcept>

namespace ringwright::models {
namespace {

constexpr double kLargest = 999.974950, kAtLargest = 3.983035;
constexpr double kA = 301.797, kB = 522528.9, kC = 69.34881;

void check(double temperature) {
  if (!(temperature >= 0.0 && temperature <= 40.0))
    throw std::invalid_argument("the density of water is known from 0 to 40 degC only");
}

}  // namespace

double water_density(double temperature) {
  check(temperature);
  const double t = temperature - kAtLargest;
  return kLargest * (1.0 - t * t * (temperature + kA) / (kB * (temperature + kC)));
}

double water_expansion(double temperature) {
  check(temperature);
  const double t = temperature - kAtLargest;
  const double top = t * t * (temperature + kA), bottom = kB * (temperature + kC);
  const double top_slope = 2.0 * t * (temperature + kA) + t * t;
  const double slope = (top_slope * bottom - top * kB) / (bottom * bottom);
  return kLargest * slope / water_density(temperature);
}

double water_weight_at_20() { return water_density(20.0) * standard_gravity; }

}  // namespace ringwright::models
