#include "models/protocol/stop_rule.hpp"

#include <catch2/catch.hpp>
#include <set>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("stop rule presets: each has a name, a source and what its kind needs", "[protocol]") {
  std::set<std::string> names;
  for (const StopRule& rule : stop_rule_presets()) {
    INFO(rule.name);
    CHECK(names.insert(rule.name).second);
    CHECK_FALSE(rule.name.empty());
    CHECK_FALSE(rule.source.empty());
    if (rule.kind == StopKind::after_time) CHECK(rule.time > 0.0);
    if (rule.kind == StopKind::after_volume) CHECK(rule.volume > 0.0);
    if (rule.kind == StopKind::change_within_share) CHECK((rule.share > 0.0 && rule.share < 1.0));
    if (rule.kind == StopKind::change_within_amount) CHECK(rule.amount > 0.0);
    if (rule.kind == StopKind::change_within_share || rule.kind == StopKind::change_within_amount)
      CHECK(rule.readings >= 2);
  }
  CHECK(names.size() >= 10);
}

TEST_CASE("stop rule presets: whatever an agency or a standard wrote asks for its edition",
          "[protocol]") {
  for (const StopRule& rule : stop_rule_presets()) {
    INFO(rule.name);
    const bool published = rule.source.find("common") == std::string::npos;
    CHECK(rule.check_edition == published);
  }
}

TEST_CASE("stop rule presets: the figures", "[protocol]") {
  // ASTM D3385 and the Pennsylvania manual (both from memory). A quarter inch in half an hour is
  // half an inch per hour, 12.7 mm/h; in ten minutes 1.5 in/h; a sixteenth in half an hour 1/8
  // in/h.
  const double in_per_h = 0.0254 / 3600;
  CHECK(stop_rule_preset("six hours").time == 21600.0);
  const StopRule& half_hours = stop_rule_preset("four half-hour drops within a quarter inch");
  CHECK(half_hours.kind == StopKind::change_within_amount);
  CHECK(half_hours.readings == 4);
  CHECK(half_hours.amount == Approx(0.5 * in_per_h).epsilon(1e-13));
  CHECK(stop_rule_preset("four ten-minute drops within a quarter inch").amount ==
        Approx(1.5 * in_per_h).epsilon(1e-13));
  CHECK(stop_rule_preset("two half-hour drops within a sixteenth inch").amount ==
        Approx(in_per_h / 8).epsilon(1e-13));
  CHECK(stop_rule_preset("three readings within five percent").share == 0.05);
}

TEST_CASE("stop rule presets: an unknown name is answered with the known ones", "[protocol]") {
  CHECK_THROWS_WITH(stop_rule_preset("seven hours"),
                    Catch::Contains("\"seven hours\"") && Catch::Contains("six hours, four hours"));
}
