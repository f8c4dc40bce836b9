#include "models/ring/sealed_volume.hpp"

#include <cmath>
#include <limits>
#include <stdexcept>

#include "models/water/density.hpp"

namespace ringwright::models {

double sealed_volume_per_degree(double volume, double temperature) {
  if (!(volume >= 0.0)) throw std::invalid_argument("a volume must not be below 0");
  return volume * water_expansion(temperature);
}

double allowable_temperature_swing(double volume, double temperature, double flow, double interval,
                                   double share) {
  if (!(flow > 0.0 && interval > 0.0 && share > 0.0))
    throw std::invalid_argument("flow, interval and share must be above 0");
  const double per_degree = std::abs(sealed_volume_per_degree(volume, temperature));
  return per_degree > 0.0 ? share * flow * interval / per_degree
                          : std::numeric_limits<double>::infinity();
}

}  // namespace ringwright::models
