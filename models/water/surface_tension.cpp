#include "models/water/surface_tension.hpp"

#include <cmath>
#include <stdexcept>

namespace ringwright::models {

double water_surface_tension(double temperature) {
  if (!(temperature >= -25.0 && temperature <= 100.0))
    throw std::invalid_argument("the surface tension of water is known from -25 to 100 degC only");
  const double tau = 1.0 - (temperature + 273.15) / 647.096;
  return 0.2358 * std::pow(tau, 1.256) * (1.0 - 0.625 * tau);
}

}  // namespace ringwright::models
