#include "models/ring/evaporation_share.hpp"

#include <limits>
#include <stdexcept>

namespace ringwright::models {

double evaporation_share(double evaporation, double rate) {
  if (!(evaporation >= 0.0 && rate >= 0.0))
    throw std::invalid_argument("evaporation and rate must not be below 0");
  if (evaporation == 0.0) return 0.0;
  return rate > 0.0 ? evaporation / rate : std::numeric_limits<double>::infinity();
}

}  // namespace ringwright::models
