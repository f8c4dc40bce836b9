#include "cases/simulate/verdict_table.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/simulate/printed_number.hpp"

namespace ringwright::cases {
namespace {

using models::StopKind;
using postprocess::RuleVerdict;

std::string row(const RuleVerdict& verdict, bool governs) {
  const std::string name =
      rule_words(verdict.rule) + (verdict.rule.check_edition ? " (check your edition)" : "");
  if (!verdict.stop) {
    return fmt::format("  {:1} {:50} {:>10}\n", governs ? ">" : "", name, "not met");
  }
  // No steady rate belongs to a falling head.
  const bool steady = verdict.above_steady.value != 0.0 || verdict.above_steady.error != 0.0;
  return fmt::format(
      "  {:1} {:50} {:>10} {:>7} {:>6} {:>7} {:>7}\n", governs ? ">" : "", name,
      time_text(*verdict.stop), mm_per_hour(verdict.rate.value), inch_per_hour(verdict.rate.value),
      steady ? percent(verdict.above_steady.value) : "-", litres(verdict.supply_volume.value));
}

}  // namespace

std::string rule_words(const models::StopRule& rule) {
  if (!rule.name.empty()) return rule.name;
  switch (rule.kind) {
    case StopKind::after_time:
      return "after " + time_text(rule.time);
    case StopKind::change_within_share:
      return fmt::format("{} readings within {}", rule.readings, given_percent(rule.share));
    case StopKind::change_within_amount:
      return fmt::format("{} readings within {:.4g} mm/h", rule.readings, rule.amount * 3.6e6);
    case StopKind::after_volume:
      return fmt::format("after {:.4g} L into the ground", rule.volume * 1e3);
  }
  return "";
}

std::string verdict_table(const postprocess::Answer& answer) {
  const auto& verdicts = answer.verdicts;
  if (verdicts.size() < 2) return "";
  std::string text =
      fmt::format("  {:52} {:>10} {:>14} {:>7} {:>7}\n", "Stop rules, judged on the record as read",
                  "stops at", "true rate", "above", "water") +
      fmt::format("  {:52} {:>10} {:>7} {:>6} {:>7} {:>7}\n", "", "", "mm/h", "in/h", "steady",
                  "L");
  for (std::size_t i = 0; i < verdicts.size(); ++i) text += row(verdicts[i], i == 0);
  return answer.outer_water ? text + "    water of the inner ring\n" : text;
}

}  // namespace ringwright::cases
