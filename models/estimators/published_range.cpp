#include "models/estimators/published_range.hpp"

#include <cmath>
#include <stdexcept>

namespace ringwright::models {
namespace {

// 5 cm typed as 0.05 m and 5/100 m must both count as inside.
constexpr double kRounding = 1e-9;

double slack(double limit) { return std::isinf(limit) ? 0.0 : kRounding * std::abs(limit); }

bool inside(const PublishedLimit& limit, double value) {
  return value >= limit.lowest - slack(limit.lowest) &&
         value <= limit.highest + slack(limit.highest);
}

}  // namespace

std::vector<LimitBroken> limits_broken(std::span<const PublishedLimit> limits,
                                       std::span<const double> values) {
  if (limits.size() != values.size()) throw std::invalid_argument("one value per limit is needed");
  std::vector<LimitBroken> broken;
  for (std::size_t i = 0; i < limits.size(); ++i) {
    if (!inside(limits[i], values[i])) broken.push_back({limits[i], values[i]});
  }
  return broken;
}

}  // namespace ringwright::models
