#include "models/ring/ring_mass.hpp"

#include <numbers>
#include <stdexcept>

namespace ringwright::models {

double ring_mass(double radius, double wall, double height, double density) {
  if (!(radius > 0.0 && wall > 0.0 && height > 0.0 && density > 0.0))
    throw std::invalid_argument("radius, wall, height and density of a ring must be above 0");
  return density * std::numbers::pi * wall * (2.0 * radius + wall) * height;
}

}  // namespace ringwright::models
