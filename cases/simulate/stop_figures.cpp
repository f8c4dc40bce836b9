#include "cases/simulate/stop_figures.hpp"

#include <cmath>

#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {

using postprocess::Answer;

std::optional<double> stop_time(const Answer& answer) {
  if (const auto* row = stop_of(answer)) return row->time;
  if (answer.record.readings.empty() || answer.stages.empty()) return std::nullopt;
  return answer.stages.back().to;
}

postprocess::Figure rate_at_stop(const Answer& answer) {
  if (const auto* row = stop_of(answer)) return row->rate;
  for (std::size_t i = answer.stages.size(); i-- > 0;) {
    if (answer.stages[i].rate.value != 0.0) return answer.stages[i].rate;
  }
  return {};
}

double water_to_bring(const Answer& answer) {
  const double outer = answer.outer_water ? answer.outer_water->supply.value : 0.0;
  if (const auto* row = stop_of(answer)) return row->supply_volume.value + outer;
  return answer.water.supply.value + outer;
}

bool has_rule(const Answer& answer) {
  return answer.question.stop_readings > 0 || !answer.question.rules.empty();
}

const postprocess::HeadPair* shown_pair(const Answer& answer) {
  for (std::size_t i = answer.pairs.size(); i-- > 0;) {
    if (answer.pairs[i].physical) return &answer.pairs[i];
  }
  return nullptr;
}

bool differ(double one, double other) {
  return std::isfinite(one) && std::isfinite(other) && std::abs(one - other) > 0.05 * std::abs(one);
}

}  // namespace ringwright::cases
