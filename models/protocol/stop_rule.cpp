#include "models/protocol/stop_rule.hpp"

#include <stdexcept>
#include <vector>

namespace ringwright::models {
namespace {

constexpr double kMinute = 60.0, kHour = 3600.0, kInch = 0.0254;

struct Origin {
  std::string name, source;
  bool check_edition;
};

StopRule named(const Origin& origin) {
  StopRule rule;
  rule.name = origin.name, rule.source = origin.source;
  rule.check_edition = origin.check_edition;
  return rule;
}

StopRule after(double time, const Origin& origin) {
  StopRule rule = named(origin);
  rule.kind = StopKind::after_time, rule.time = time;
  return rule;
}

StopRule within_share(int readings, double share, const Origin& origin) {
  StopRule rule = named(origin);
  rule.kind = StopKind::change_within_share, rule.readings = readings, rule.share = share;
  return rule;
}

// Drops of the level that differ by at most `drop` between intervals as long as `interval`.
StopRule within_drop(int readings, double drop, double interval, const Origin& origin) {
  StopRule rule = named(origin);
  rule.kind = StopKind::change_within_amount, rule.readings = readings;
  rule.amount = drop / interval;
  return rule;
}

std::vector<StopRule> make_presets() {
  const std::string research = "common in published tests, from memory";
  const std::string state_manual = "Pennsylvania stormwater manual, from memory";
  const std::string percolation = "rules for percolation tests of several states, from memory";
  return {
      after(6 * kHour, {"six hours", "ASTM D3385, from memory (six hours or more)", true}),
      after(4 * kHour, {"four hours",
                        "Virginia Conservation Assistance Program, infiltration test read every "
                        "hour for four hours (a stored copy)",
                        true}),
      within_drop(4, kInch / 4, 30 * kMinute,
                  {"four half-hour drops within a quarter inch", state_manual, true}),
      within_drop(4, kInch / 4, 10 * kMinute,
                  {"four ten-minute drops within a quarter inch", state_manual, true}),
      within_drop(2, kInch / 16, 30 * kMinute,
                  {"two half-hour drops within a sixteenth inch", percolation, true}),
      within_drop(2, kInch / 16, 10 * kMinute,
                  {"two ten-minute drops within a sixteenth inch", percolation, true}),
      within_share(3, 0.05, {"three readings within five percent", research, false}),
      within_share(5, 0.05, {"five readings within five percent", research, false}),
      within_share(3, 0.10, {"three readings within ten percent", research, false}),
      within_share(5, 0.10, {"five readings within ten percent", research, false}),
      after(kHour, {"one hour", "common practice, no source", false}),
      after(2 * kHour, {"two hours", "common practice, no source", false}),
  };
}

}  // namespace

std::span<const StopRule> stop_rule_presets() {
  static const std::vector<StopRule> presets = make_presets();
  return presets;
}

const StopRule& stop_rule_preset(const std::string& name) {
  std::string known;
  for (const StopRule& rule : stop_rule_presets()) {
    if (rule.name == name) return rule;
    known += (known.empty() ? "" : ", ") + rule.name;
  }
  throw std::invalid_argument("no stop rule is called \"" + name + "\"; there are: " + known);
}

}  // namespace ringwright::models
