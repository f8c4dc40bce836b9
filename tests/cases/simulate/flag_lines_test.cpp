#include "cases/simulate/flag_lines.hpp"

#include <catch2/catch.hpp>
#include <string>

#include "cases/simulate/first_screen.hpp"
#include "tests/cases/simulate/synthetic_protocols.hpp"

namespace {

using namespace ringwright;
using Catch::Contains;
using postprocess::Flag;
using postprocess::FlagKind;

// Lines are broken where they are full: compared with blanks instead of the breaks.
std::string one_line(std::string text) {
  std::string line;
  for (const char c : text) {
    const char next = c == '\n' ? ' ' : c;
    if (next != ' ' || line.empty() || line.back() != ' ') line += next;
  }
  return line;
}

std::string lines_of(const std::vector<Flag>& flags) {
  postprocess::Answer answer = test::first_answer();
  answer.question.reading_interval = 600.0;
  answer.flags = flags;
  return one_line(cases::flag_lines(answer));
}

TEST_CASE("each flag has its number, its limit and a cure", "[screen]") {
  // 490 N over 9.80665 m/s2 are 50 kgf, two and a half pieces of 20 kg; 2 x 10 cm x 0.9 = 18 cm;
  // 25 cm from the axis of a ring of 15 cm; 2.5 of 10 divisions in 10 min: 40 min.
  const std::vector<std::pair<Flag, std::vector<const char*>>> expected = {
      {{FlagKind::lid_lift, 490.3325, 300.0, 45.0},
       {"490 N (50 kgf)", "weigh 300 N", "Lay on 45 kg, as 3 pieces of at most 20 kg",
        "the clamps carry the lift too", "competent person", "local rules for pressure equipment"}},
      {{FlagKind::lid_not_for_use, 1.2, 0.0},
       {"can reach is 120 cm", "rating of the lid is not stated", "relief valve",
        "competent person"}},
      {{FlagKind::piping, 2.5, 0.9}, {"is 2.5, limit 0.9", "below 18.0 cm", "local code"}},
      {{FlagKind::fracture, 1.5, 1.0}, {"1.50 times the weight", "limit 1", "Lower the head"}},
      {{FlagKind::insertion_share, 0.75, 1.0 / 3},
       {"75 % of the liner", "limit 33 %", "repair and record", "competent person"}},
      {{FlagKind::surfacing, 0.002, 2700.0, 0.25},
       {"from 45 min", "10.0 cm from the wall", "2.0 L", "Drive deeper"}},
      {{FlagKind::supply_exceeded, 0.03, 0.10, 0.0, true},
       {"Outer ring: ", "by up to 3.0 cm of the 10.0 cm", "bigger hose"}},
      {{FlagKind::reservoir_emptied, 5400.0, 0.02},
       {"tank of 20 L is empty after 1 h 30 min", "larger one"}},
      {{FlagKind::ring_emptied, 3600.0, 0.0}, {"empty since 1 h", "not a rate of the soil"}},
      {{FlagKind::flow_below_gauge, 2.5, 10.0},
       {"2.5 divisions of the gauge, 10 are wanted", "read every 40 min"}},
      {{FlagKind::evaporation_share, 0.31, 0.1}, {"is 31 %", "limit 10 %", "Cover the pond"}},
      {{FlagKind::stop_rule_not_met, 0.2, 0.0}, {"20 % above steady", "Allow more time"}},
      {{FlagKind::stop_rule_not_met, -0.2, 0.0}, {"20 % below steady"}},
      {{FlagKind::domain_reached, 8.0, 0.0}, {"8.0 m deep", "in doubt"}},
      {{FlagKind::sealed_temperature, 47e-6, 20e-6}, {"by 47 mL", "200 mL", "Shade"}}};
  for (const auto& [flag, parts] : expected) {
    const std::string line = lines_of({flag});
    CHECK_THAT(line, Catch::StartsWith(" ! "));
    for (const char* part : parts) CHECK_THAT(line, Contains(part));
  }
}

TEST_CASE("no flag, no line", "[screen]") { CHECK(lines_of({}).empty()); }

TEST_CASE("what can hurt comes first", "[screen]") {
  const std::string lines = lines_of({{FlagKind::reservoir_emptied, 60.0, 0.02},
                                      {FlagKind::piping, 2.5, 0.9},
                                      {FlagKind::lid_lift, 100.0, 50.0, 10.0},
                                      {FlagKind::lid_not_for_use, 0.0, 0.0}});
  const auto at = [&](const char* words) {
    const auto place = lines.find(words);
    REQUIRE(place != std::string::npos);
    return place;
  };
  CHECK(at("Not for use") < at("lift the lid"));
  CHECK(at("lift the lid") < at("break out"));
  CHECK(at("break out") < at("tank of"));
}

TEST_CASE("a lid without relief and rating is marked at the top", "[screen]") {
  auto simulation = test::two_head_simulation();
  auto& answer = simulation.tests[0].answers[0];
  const auto screen = [&] {
    return cases::first_screen(simulation.what, simulation.tests.front());
  };
  answer.flags = {{FlagKind::lid_lift, 100.0, 50.0, 10.0}};
  CHECK_THAT(screen(), !Contains("NOT FOR USE"));
  answer.flags.push_back({FlagKind::lid_not_for_use, 0.0, 0.0});
  CHECK(screen().find("*** NOT FOR USE") < screen().find("Stop at"));
}

}  // namespace
