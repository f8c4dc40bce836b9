#include "models/water/viscosity.hpp"

#include <cmath>
#include <stdexcept>

namespace ringwright::models {

double water_viscosity(double temperature) {
  if (!(temperature >= -20.0 && temperature <= 110.0)) {
    throw std::invalid_argument("the viscosity of water is known from -20 to 110 degC only");
  }
  const double T = (temperature + 273.15) / 300.0;
  return 1e-6 * (280.68 * std::pow(T, -1.9) + 511.45 * std::pow(T, -7.7) +
                 61.131 * std::pow(T, -19.6) + 0.45903 * std::pow(T, -40.0));
}

double viscosity_ratio(double temperature) {
  return water_viscosity(temperature) / water_viscosity(20.0);
}

}  // namespace ringwright::models
