#include "cases/simulate/stop_clause.hpp"

#include <fmt/format.h>

#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/stop_figures.hpp"

namespace ringwright::cases {
namespace {

std::string litres_to_bring(const postprocess::Answer& answer) {
  const double all = water_to_bring(answer);
  std::string text = rounded_up(all * 1e3) + " L";
  if (!answer.outer_water) return text;
  const double outer = answer.outer_water->supply.value;
  return text + fmt::format(" (inner ring {}, outer {})", rounded_up((all - outer) * 1e3),
                            rounded_up(outer * 1e3));
}

}  // namespace

std::string stop_clause(const postprocess::Answer& answer, double time) {
  const std::string at = time_text(time), water = litres_to_bring(answer);
  if (answer.ended_early) {
    const double end = answer.run.ended > time ? answer.run.ended : time;
    return fmt::format(
        "The water is used up and the test ends at {}; the last reading is at {}, "
        "after {}.",
        time_text(end), at, water);
  }
  if (!answer.stop_rule_met && has_rule(answer)) {
    return fmt::format("The stop rule is not met by {}, the longest you allow; bring {}.", at,
                       water);
  }
  return fmt::format("Stop at {}, bring {}.", at, water);
}

}  // namespace ringwright::cases
