#include "postprocess/reading/stop_rule.hpp"

#include <cmath>

namespace ringwright::postprocess {

std::optional<std::size_t> first_steady_reading(const models::Record& record, int readings,
                                                double within) {
  const auto n = static_cast<std::size_t>(readings);
  for (std::size_t last = n - 1; last < record.readings.size(); ++last) {
    double mean = 0.0;
    for (std::size_t i = last + 1 - n; i <= last; ++i) mean += record.rate(i) / readings;
    bool steady = true;
    for (std::size_t i = last + 1 - n; i <= last; ++i)
      steady = steady && std::abs(record.rate(i) - mean) <= within * std::abs(mean);
    if (steady) return last;
  }
  return std::nullopt;
}

}  // namespace ringwright::postprocess
