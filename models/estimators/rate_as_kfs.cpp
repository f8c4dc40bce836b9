#include "models/estimators/rate_as_kfs.hpp"

#include <stdexcept>

namespace ringwright::models {

double rate_as_kfs(const SteadyRing& test) {
  if (!(test.rate >= 0.0)) throw std::invalid_argument("a rate must not be below 0");
  return test.rate;
}

}  // namespace ringwright::models
