#include "models/theory/saturated_ring_shape.hpp"

#include <numbers>
#include <stdexcept>

namespace ringwright::models {

double saturated_ring_flow_factor(double insertion_over_radius) {
  const double x = insertion_over_radius;
  if (!(x >= 0.0)) throw std::invalid_argument("an insertion must not be below 0");
  return std::numbers::pi / (x + 0.6133 + 1.0 / (8.0 * x + 5.81));
}

}  // namespace ringwright::models
