#include "models/theory/wooding_disc.hpp"

#include <numbers>

namespace ringwright::models {

double wooding_disc_flow(double Ks, double alpha, double radius) {
  return std::numbers::pi * radius * radius * Ks + 4.0 * radius * Ks / alpha;
}

}  // namespace ringwright::models
