#include "cases/simulate/water_table.hpp"

#include <fmt/format.h>

#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/stop_figures.hpp"

namespace ringwright::cases {
namespace {

using postprocess::WaterUse;

bool worth_a_table(const postprocess::Answer& answer) {
  return answer.outer_water || !answer.stages.empty() || answer.water.evaporated > 0.0 ||
         answer.water.removed > 0.0;
}

std::string row(std::string_view name, const WaterUse& water, const std::string& peak) {
  return fmt::format("    {:14} {:>8} {:>8} {:>11} {:>11} {:>9}   {:>11}\n", name,
                     litres(water.soil.value), litres(water.standing), litres(water.evaporated),
                     litres(water.removed), rounded_up(water.supply.value * 1e3), peak);
}

// What is poured by hand before the test is no flow of the supply.
std::string peak(const WaterUse& water) {
  return water.peak_flow > 0.0 ? flow(water.peak_flow) : "-";
}

WaterUse sum(const WaterUse& inner, const WaterUse& outer) {
  WaterUse both;
  both.soil.value = inner.soil.value + outer.soil.value;
  both.supply.value = inner.supply.value + outer.supply.value;
  both.standing = inner.standing + outer.standing;
  both.evaporated = inner.evaporated + outer.evaporated;
  both.removed = inner.removed + outer.removed;
  return both;
}

}  // namespace

std::string water_table(const postprocess::Answer& answer) {
  const auto time = stop_time(answer);
  if (!time || !worth_a_table(answer)) return "";
  std::string text =
      fmt::format("  {:16} {:>8} {:>8} {:>11} {:>11} {:>9}   {:>11}\n", "Water, L", "in soil",
                  "standing", "evaporated", "let out", "to bring", "most in 60 s");
  const WaterUse& inner = answer.water;
  text += row(answer.outer_water ? "inner ring" : "the ring", inner, peak(inner));
  if (!answer.outer_water) return text;
  return text + row("outer ring", *answer.outer_water, peak(*answer.outer_water)) +
         row("both", sum(inner, *answer.outer_water), "-");
}

}  // namespace ringwright::cases
