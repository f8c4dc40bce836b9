#include "cases/simulate/first_screen.hpp"

#include <catch2/catch.hpp>
#include <string>

#include "tests/cases/simulate/synthetic_answer.hpp"

namespace {

using namespace ringwright;
using Catch::Contains;

std::string screen_of(const cases::Simulation& simulation) {
  return cases::first_screen(simulation.what, simulation.tests.front());
}

// Written by hand from the round numbers of the synthetic answer: 14 mm/h times the factors read,
// 25.4 mm to the inch, 1.3 times as much at 20 degC, 34 mm/h over 0.07 m2 being 40 mL/min.
constexpr const char* whole_screen =
    R"(Ringwright 0.1.0: one virtual ring test for Alderwick, twelve gardens
one head: 30 cm ring, 10 cm into silt loam (moist), 5 cm constant head, water 10 degC

  Stop at 3 h, bring 13 L. The form will say 34 mm/h (1.34 in/h); the true Kfs is 14.0 mm/h at
  10 degC (18.2 at 20 degC). Read as Kfs that rate is 2.4 times the true one; by the one-head
  formula with alpha* 0.12 1/cm, 1.40 times.

       stop at    rate then      water      reads x (true Kfs = 1)    above
                  mm/h    in/h       L     rate  formula  formula+   steady
        30 min      48    1.89     6.1      3.4      2.0      1.50     60 %
  >        3 h      34    1.34    12.8      2.4     1.40      1.20     14 %  your rule stops here
           6 h      32    1.26    19.7      2.3     1.31      1.12    6.7 %
         never      30    1.18       -      2.1     1.23      1.05      0 %
    formula: one head, Reynolds & Elrick 1990, with the assumed alpha* 0.12 1/cm
    formula+: the same with this soil's own capillary length, 11.2 cm: not available to a crew
    water with the 3.5 L that fill the ring; above steady: not yet steady by so much

  Kfs read at 3 h               at 10 degC          at 20 degC   reads x
                             mm/h     in/h       mm/h     in/h
    rate read as Kfs           34     1.34         44     1.74       2.4
    formula                  19.6     0.77         25     1.00      1.40
    formula+                 16.8     0.66         22     0.86      1.20  not available to a crew
    true                     14.0     0.55       18.2     0.72      1.00

  Wetted at 3 h: 30 cm deep, 7.2 cm outside the wall. Nothing below that has been tested. Within
    5 % of steady after 7.5 h.
  Supply: 3.5 L to fill the ring while the soil draws up to 900 mL/min; at the stop 40 mL/min.
  Formula outside its published range (from memory, check the paper): radius 15 cm, stated for
    5 to 10 cm.

  Ground: silt loam by First & Table 1901: suction 300 cm, 25 % water, 56 % full; capillary
    length 11.2 cm.
  Assumed, change if wrong: water 10 degC; ruler 1 mm.
  Doubt about soil and site, not in these figures, far exceeds the arithmetic; numerical error
    at most 0.4 % (wetted: 0.40 cm down, 0.20 cm beside), water balance 2e-08.
  Prediction, not a measurement. Cracks, roots, swelling, clogging and leaks along the wall are
    not in it. The local code and the licensed professional decide.
  Files  out: record.csv answer.json
         out/more: fields.h5
)";

TEST_CASE("the first screen says all, word for word", "[screen]") {
  const auto simulation = test::simulation_of(1);
  const std::vector<std::filesystem::path> files = {"out/record.csv", "out/answer.json",
                                                    "out/more/fields.h5"};
  CHECK(cases::first_screen(simulation.what, simulation.tests.front(), files) == whole_screen);
}

TEST_CASE("a class name shows both tables, each by its name", "[screen]") {
  const std::string screen = screen_of(test::simulation_of(2));
  // 21 mm/h over 25.4; 7.6 mm/h times 1.3; 34 over 21.
  CHECK_THAT(screen, Contains(R"(
  That is with First & Table 1901. By Second et al. 1902: stop at 4 h, 8.7 L, 21 mm/h (0.83
  in/h), true Kfs 7.6 mm/h at 10 degC (9.9 at 20 degC). Across the two published tables the rate
  reads x 2.4 to 2.8, the formula x 1.40 to 1.62.

  By First & Table 1901
       stop at )"));
  CHECK_THAT(screen, Contains("    the ladder by Second et al. 1902: --csv\n"));
  CHECK_THAT(screen, Contains("    silt loam by Second et al. 1902: suction 300 cm, 25 % water"));
  CHECK_THAT(screen, Contains(R"(
  Doubt about soil and site far exceeds the arithmetic: the tables alone differ x 1.62 in the
    rate; numerical error at most 0.4 % (wetted: 0.40 cm down, 0.20 cm beside), water balance
    2e-08.
)"));
}

TEST_CASE("a last reading in which nothing went in gives no rate and no Kfs", "[screen]") {
  auto simulation = test::simulation_of(1);
  for (auto& row : simulation.tests[0].answers[0].ladder)
    if (row.stops_here) row.rate.value = -1e-6;
  const std::string screen = screen_of(simulation);
  CHECK_THAT(screen, Contains("The last reading is no rate of the soil and gives no Kfs"));
  CHECK_THAT(screen, !Contains("The form will say"));
}

TEST_CASE("a table that was not computed is not forgotten", "[screen]") {
  auto simulation = test::simulation_of(2);
  simulation.tests[0].answers.pop_back();
  CHECK_FALSE(simulation.complete());
  CHECK_THAT(screen_of(simulation),
             Contains("That is with First & Table 1901. By Second et al. 1902: not computed.\n"));
}

TEST_CASE("numerical error is told only after the doubt about the soil", "[screen]") {
  for (const int readings : {1, 2}) {
    const std::string screen = screen_of(test::simulation_of(readings));
    const auto doubt = screen.find("  Doubt about soil and site");
    REQUIRE(doubt != std::string::npos);
    CHECK(screen.find("numerical error") > doubt);
    CHECK(screen.find("numerical error") == screen.rfind("numerical error"));
  }
}

TEST_CASE("an accuracy that is not met is said with its figure", "[screen]") {
  auto simulation = test::simulation_of(1);
  simulation.tests[0].answers[0].accuracy_met = false;
  simulation.tests[0].answers[0].worst_relative_error = 0.023;
  CHECK_THAT(screen_of(simulation), Contains(R"(far exceeds the arithmetic; the accuracy
    asked for, 1 %, is NOT MET: numerical error 2.3 % (wetted: 0.40 cm down, 0.20 cm beside),
    water balance 2e-08.)"));
}

TEST_CASE("the mark of the stop tells why the test ends", "[screen]") {
  auto simulation = test::simulation_of(1);
  auto& answer = simulation.tests[0].answers[0];
  SECTION("the rule was not met") {
    answer.stop_rule_met = false;
    CHECK_THAT(screen_of(simulation), Contains("14 %  rule not met; you stop\n"));
    CHECK_THAT(screen_of(simulation),
               Contains("The stop rule is not met by 3 h, the longest you allow; bring 13 L."));
  }
  SECTION("there is no rule") {
    answer.question.stop_readings = 0;
    CHECK_THAT(screen_of(simulation), Contains("14 %  you stop here\n"));
    CHECK_THAT(screen_of(simulation), Contains("Stop at 3 h, bring 13 L."));
  }
  SECTION("never steady") {
    answer.time_to_steady = {1000.0 * 3600.0, true};
    CHECK_THAT(screen_of(simulation), Contains("even after 42 days."));
  }
}

TEST_CASE("at 20 degC there is one temperature only", "[screen]") {
  auto simulation = test::simulation_of(1);
  simulation.what.ground.water_temperature = 20.0;
  simulation.tests[0].answers[0].question.viscosity_ratio = 1.0;
  const std::string screen = screen_of(simulation);
  CHECK_THAT(screen, Contains("the true Kfs is 14.0 mm/h at\n  20 degC. Read"));
  CHECK_THAT(screen, Contains(R"(
  Kfs read at 3 h               at 20 degC   reads x
                             mm/h     in/h
    rate read as Kfs           34     1.34       2.4
)"));
}

TEST_CASE("an interrupted run has a screen without figures it does not have", "[screen]") {
  auto simulation = test::simulation_of(1);
  auto& answer = simulation.tests[0].answers[0];
  answer.interrupted = true;
  answer.ladder.clear();
  answer.record.readings = {{600.0, 600.0, 1e-3, 1e-3, 0.05}};
  const std::string screen = screen_of(simulation);
  CHECK_THAT(screen, Contains("Ended before the stop of the test: no figures for it. The record "
                              "goes to 10 min."));
  CHECK_THAT(screen, Contains("the numerical\n    error of an interrupted run is not known"));
  CHECK_THAT(screen, !Contains("NOT MET") && !Contains("Wetted") && !Contains("stop at "));
}

TEST_CASE("a test within the formula's published range is not flagged", "[screen]") {
  auto simulation = test::simulation_of(1);
  auto& ring = simulation.tests[0].answers[0].question.setup.ring;
  ring = {0.10, 0.05};  // radius 5 to 10 cm, insertion from 3 cm, a quarter to one radius
  CHECK_THAT(screen_of(simulation), !Contains("published range"));
  ring = {0.10, 0.02};
  CHECK_THAT(screen_of(simulation), Contains("insertion 2 cm, stated\n    from 3 cm up; insertion "
                                             "over radius 0.2, stated for 0.25 to 1."));
}

TEST_CASE("what was assumed for another test is not listed", "[screen]") {
  auto simulation = test::simulation_of(1);
  simulation.what.assumed.push_back({"tests.another.read", "ruler 7 mm"});
  const std::string screen = screen_of(simulation);
  CHECK_THAT(screen, Contains("ruler 1 mm"));
  CHECK_THAT(screen, !Contains("ruler 7 mm"));
}

TEST_CASE("a second table without figures is not compared", "[screen]") {
  auto simulation = test::simulation_of(2);
  simulation.tests[0].answers[1].ladder.clear();
  simulation.tests[0].answers[1].interrupted = true;
  const std::string screen = screen_of(simulation);
  CHECK_THAT(screen, !Contains("Across the two"));
  CHECK_THAT(screen, !Contains("the tables alone differ"));
}

TEST_CASE("no line of the screen is wider than a page", "[screen]") {
  for (const int readings : {1, 2}) {
    const std::string screen = screen_of(test::simulation_of(readings));
    std::size_t begin = 0;
    for (std::size_t end = 0; (end = screen.find('\n', begin)) != std::string::npos;
         begin = end + 1) {
      CHECK(end - begin <= 100);
    }
  }
}

}  // namespace
