#include <catch2/catch.hpp>
#include <string>

#include "cases/simulate/first_screen.hpp"
#include "tests/cases/simulate/synthetic_protocols.hpp"

namespace {

using namespace ringwright;
using Catch::Contains;

// Prose is compared with blanks instead of the breaks of lines.
std::string one_line(const std::string& text) {
  std::string line;
  for (const char c : text) {
    const char next = c == '\n' ? ' ' : c;
    if (next != ' ' || line.empty() || line.back() != ' ') line += next;
  }
  return line;
}

std::string screen_of(const cases::Simulation& simulation) {
  return cases::first_screen(simulation.what, simulation.tests.front());
}

// By hand from the round numbers: 40 over 32 and 70 over 56 are a quarter above steady; 21 over 14;
// 1.3 times as much at 20 degC; 25.4 mm to the inch; 70 mm/h over 0.07 m2 are 82 mL/min.
constexpr const char* two_head_screen =
    R"(two heads: 30 cm ring, 10 cm into silt loam (moist), soaked at 5 cm, then heads 5, 20 cm, water
  10 degC

  Stop at 2 h 30 min, bring 12 L. The form will say Kfs 21 mm/h (0.83 in/h) by the two-head
  formula (5 cm, then 20 cm); the true Kfs is 14.0 mm/h at 10 degC (18.2 at 20 degC). That is
  1.50 times the true one. Through this crew's gauge, as it happens to be read here, it comes
  out as 28 mm/h.

  stage       from         to         head  rate at its end into soil    above   as read
                                        cm     mm/h    in/h         L   steady      mm/h
      1      start     30 min            5        -       -      1.00        -         -  soak
      2     30 min 1 h 30 min            5       40    1.57       3.0     25 %        41
      3 1 h 30 min 2 h 30 min           20       70     2.8       5.0     25 %        63

  Pairs of heads, Kfs             at 10 degC          at 20 degC   reads x      as read
      stages                   mm/h     in/h       mm/h     in/h                   mm/h
    2 and 3: 5, 20 cm            21     0.83         27     1.07      1.50           28
    true                       14.0     0.55       18.2     0.72      1.00

  Water, L          in soil standing  evaporated     let out  to bring   most in 60 s
    the ring            9.0      3.0           0           0        12     2.0 L/min

  Wetted at 2 h 30 min: 30 cm deep, 7.2 cm outside the wall. Nothing below that has been tested.
  Supply: 3.5 L to fill the ring while the soil draws up to 900 mL/min; at the stop 82 mL/min.
  What lies deeper than 21 cm hardly counts: twice as permeable it would move the rate at the
    stop by less than 5 %.

  Ground: silt loam)";

TEST_CASE("a two-head test tells stages and pairs, word for word", "[screen]") {
  CHECK_THAT(screen_of(test::two_head_simulation()), Contains(two_head_screen));
}

TEST_CASE("the last usable pair is shown, and why", "[screen]") {
  auto simulation = test::two_head_simulation();
  auto& answer = simulation.tests[0].answers[0];
  auto later = answer.pairs.front();
  later.kfs.value = 18.0 * test::mm_per_h;
  later.kfs_as_read = later.kfs.value;
  answer.pairs.push_back(later);
  SECTION("the last") {
    const std::string screen = screen_of(simulation);
    CHECK_THAT(screen, Contains("Kfs 18.0 mm/h") && Contains("Of the pairs the last is shown"));
    CHECK_THAT(screen, !Contains("gauge, as it happens"));
  }
  SECTION("the one before where the last is of no use") {
    answer.pairs.back().physical = false;
    const std::string screen = one_line(screen_of(simulation));
    CHECK_THAT(screen, Contains("Kfs 21 mm/h (0.83") &&
                           Contains("The last pair of heads gives no usable Kfs; shown is"));
  }
  SECTION("none") {
    for (auto& pair : answer.pairs) pair.physical = false;
    // 70 over 14
    CHECK_THAT(one_line(screen_of(simulation)),
               Contains("gives no usable Kfs from any pair") &&
                   Contains("The form will say 70 mm/h (2.8 in/h), the rate") &&
                   Contains("is 5.0 times the true one"));
  }
}

TEST_CASE("a pair that the gauge spoils is told", "[screen]") {
  auto simulation = test::two_head_simulation();
  auto& pair = simulation.tests[0].answers[0].pairs.front();
  pair.physical_as_read = false;
  const std::string screen = screen_of(simulation);
  CHECK_THAT(one_line(screen), Contains("set the heads further apart"));
  CHECK_THAT(screen, Contains("      1.50   not usable\n"));
}

TEST_CASE("a stop before the last stage is told", "[screen]") {
  auto simulation = test::two_head_simulation();
  auto& answer = simulation.tests[0].answers[0];
  answer.question.setup.program.stages = simulation.what.tests[0].program.stages;
  for (std::size_t i = 0; i < 3; ++i) answer.stages[i].stage = i;
  CHECK_THAT(screen_of(simulation), !Contains("never run"));
  answer.stages.pop_back();
  answer.pairs.clear();
  CHECK_THAT(screen_of(simulation), Contains("! The stop comes in stage 2 of 3"));
}

TEST_CASE("a falling head tells level and rate against time", "[screen]") {
  // 35 and 28 mm in an hour; 35 over 14 and 28 over 14.
  const std::string screen = screen_of(test::falling_simulation());
  CHECK_THAT(one_line(screen),
             Contains("falling head from 10 cm, filled up again at 3 cm, water 10 degC") &&
                 Contains("The form will say 28 mm/h (1.10 in/h), the rate of the last reading") &&
                 Contains("Read as Kfs that rate is 2.0 times the true one."));
  CHECK_THAT(screen, Contains(R"(
      1      start        2 h      10 to 4       28    1.10       7.0        -        28  filled up 1 x

          time  level, cm  rate, mm/h     in/h   reads x
           1 h        6.5          35     1.38       2.5
           2 h        4.0          28     1.10       2.0
)") && Contains("On the way: 1 h 7 min filled up again.\n"));
}

TEST_CASE("a double ring tells the water of both rings", "[screen]") {
  // 9.3 and 3.5 make 12.8; 40, 10.6, 0.4 and 6 make 57; 69.8 together, brought as 70.
  const std::string screen = screen_of(test::double_ring_simulation());
  CHECK_THAT(screen, Contains("double: 30 and 60 cm double ring, 10 and 15 cm into silt loam"));
  CHECK_THAT(screen, Contains("Stop at 3 h, bring 70 L (inner ring 13, outer 57)."));
  CHECK_THAT(screen, Contains(R"(
    inner ring          9.3      3.5           0           0        13             -
    outer ring           40     10.6        0.40         6.0        57             -
    both                 49     14.1        0.40         6.0        70             -
)"));
  CHECK_THAT(screen, Contains("Outer ring at the stop: 38 mm/h over its own area, steady 33."));
  CHECK_THAT(screen, Contains("the formula is made for one ring"));
}

TEST_CASE("rules are judged side by side", "[screen]") {
  auto simulation = test::simulation_of(1);
  auto& verdicts = simulation.tests[0].answers[0].verdicts;
  postprocess::RuleVerdict governing;
  governing.stop = 10800.0;
  governing.rate.value = 34.0 * test::mm_per_h;
  governing.above_steady = {0.144, 0.001};
  governing.supply_volume.value = 12.8 * test::litre;
  verdicts.push_back(governing);
  CHECK_THAT(screen_of(simulation), !Contains("Stop rules"));
  postprocess::RuleVerdict preset;
  preset.rule.name = "six hours";
  preset.rule.check_edition = true;
  verdicts.push_back(preset);
  CHECK_THAT(screen_of(simulation), Contains(R"(
  > 3 readings within 5 %                                     3 h      34   1.34    14 %    12.8
    six hours (check your edition)                        not met
)"));
}

TEST_CASE("what the gauge makes of the last reading is told where it differs", "[screen]") {
  auto simulation = test::simulation_of(1);
  auto& answer = simulation.tests[0].answers[0];
  answer.record.readings = {{3600.0, 3600.0, 0.07 * 0.034, 0.07 * 0.034, 0.05}};
  answer.as_read = answer.record;
  answer.as_read.readings[0].volume = 0.07 * 0.035;  // 3 % more
  CHECK_THAT(screen_of(simulation), !Contains("crew's gauge"));
  answer.as_read.readings[0].volume = 0.07 * 0.041;  // 21 % more
  CHECK_THAT(screen_of(simulation), Contains("the last reading is 41 mm/h where 34 went into"));
}

TEST_CASE("a test that runs dry says so", "[screen]") {
  auto simulation = test::two_head_simulation();
  auto& answer = simulation.tests[0].answers[0];
  answer.ended_early = true;
  answer.run.ended = 9300.0;
  CHECK_THAT(
      one_line(screen_of(simulation)),
      Contains("The water is used up and the test ends at 2 h 35 min; the last reading is at "
               "2 h 30 min, after 12 L."));
  answer.stages.clear();
  answer.pairs.clear();
  answer.record.readings.clear();
  CHECK_THAT(screen_of(simulation), Contains("The water is used up before the first reading"));
}

TEST_CASE("no line of a screen is wider than a page and a remark", "[screen]") {
  for (const auto& simulation :
       {test::two_head_simulation(), test::falling_simulation(), test::double_ring_simulation()}) {
    const std::string screen = screen_of(simulation);
    std::size_t begin = 0;
    for (std::size_t end = 0; (end = screen.find('\n', begin)) != std::string::npos;
         begin = end + 1) {
      CHECK(end - begin <= 104);
    }
  }
}

}  // namespace
