#pragma once
#include <cmath>
#include <vector>

namespace ringwright::validation {

/// Slope of log(error) over log(size) between the first and the last entry: the order of
/// convergence measured.
inline double measured_order(const std::vector<double>& sizes, const std::vector<double>& errors) {
  return std::log(errors.front() / errors.back()) / std::log(sizes.front() / sizes.back());
}

}  // namespace ringwright::validation
