#include "models/theory/saturated_disc.hpp"

namespace ringwright::models {

double saturated_disc_flow(double Ks, double radius, double head) {
  return 4.0 * Ks * radius * head;
}

}  // namespace ringwright::models
