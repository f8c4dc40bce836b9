#include "cases/simulate/pond_programs.hpp"

#include <catch2/catch.hpp>
#include <nlohmann/json.hpp>
#include <numbers>
#include <string>

#include "cases/input/read_case.hpp"
#include "cases/simulate/question.hpp"
#include "cases/simulate/resolved_case.hpp"

namespace ringwright::cases {
namespace {

Case case_of(const std::string& keys) {
  return read_case(
      "ringwright: 1\nground: { texture: loam, published: Carsel & Parrish 1988 }\n"
      "tests:\n  a: { ring: 20 cm, insert: 10 cm, " +
          keys + " }\n",
      "x.yaml");
}

postprocess::Question question_of(const Case& what) {
  return cases::question_of(what.tests[0], what.ground, what.ground.variants[0], 0.01, 1);
}

const double ring = std::numbers::pi * 0.01;  // [m2], 20 cm wide

}  // namespace

TEST_CASE("a plain test has no program", "[question]") {
  const auto setup = question_of(case_of("head: 5 cm")).setup;
  CHECK(setup.program.stages.empty());
  CHECK(setup.outer_program.stages.empty());
  CHECK_FALSE(setup.outer_ring);
}

TEST_CASE("stages, supply, incidents and evaporation reach the solver", "[question]") {
  const auto setup =
      question_of(
          case_of("outer ring: 40 cm, outer head: 8 cm, heads: 5 cm then 15 cm, supply: 6 L/min, "
                  "reservoir: 50 L, when empty: stops, evaporation: 5 mm/d, "
                  "incident: outer ring empty from 10 min to 20 min"))
          .setup;
  REQUIRE(setup.program.stages.size() == 2);
  CHECK(setup.pond_head == Approx(0.05));
  CHECK(setup.duration == Approx(8 * 3600));
  CHECK(setup.program.supply.largest_rate.value() == Approx(1e-4));
  CHECK(setup.program.supply.when_empty == models::WhenEmpty::stop);
  CHECK(setup.program.evaporation == Approx(5e-3 / 86400));
  CHECK(setup.program.empty.empty());
  REQUIRE(setup.outer_program.stages.size() == 1);
  CHECK(setup.outer_program.stages[0].head == Approx(0.08));
  CHECK(setup.outer_program.stages[0].duration == Approx(setup.duration));
  CHECK(setup.outer_program.evaporation == Approx(5e-3 / 86400));
  REQUIRE(setup.outer_program.empty.size() == 1);
}

TEST_CASE("under a lid the ring stays full and the level moves in the standpipe", "[question]") {
  const Case what = case_of(
      "head: 8 cm, pressure: 40 cm, pressed by: standpipe 5 cm wide, evaporation: 5 mm/d, "
      "lid: { relief: 1 m, rating: 20 kPa }");
  const models::PondProgram program = pond_program(what.tests[0]);
  const std::optional<models::Vessel> vessel = program.vessel;
  REQUIRE(vessel);
  CHECK(vessel->area == Approx(std::numbers::pi * 0.000625));
  CHECK(vessel->base_head == Approx(0.08));
  CHECK(vessel->still_volume == Approx(ring * 0.08));
  CHECK(vessel->volume(0.48) == Approx(ring * 0.08 + std::numbers::pi * 0.000625 * 0.40));
  CHECK(program.evaporation == 0.0);
}

TEST_CASE("pressed by air no level moves", "[question]") {
  const Case what =
      case_of("head: 8 cm, pressure: 40 cm, pressed by: air, lid: { relief: 1 m, rating: 20 kPa }");
  const std::optional<models::Vessel> vessel = pond_program(what.tests[0]).vessel;
  REQUIRE(vessel);
  CHECK(vessel->area == 0.0);
}

TEST_CASE("a tank beside the ring moves with it from the soil up", "[question]") {
  const Case what = case_of("'fall': 'from 10 cm', 'falls in': tank 40 cm wide");
  const std::optional<models::Vessel> vessel = pond_program(what.tests[0]).vessel;
  REQUIRE(vessel);
  CHECK(vessel->area == Approx(ring + std::numbers::pi * 0.04));
  CHECK(vessel->base_head == 0.0);
}

TEST_CASE("gauge, rules and circumstances are asked as the case says", "[question]") {
  const auto question = question_of(case_of(
      "head: 8 cm, pressure: 40 cm, gauge: 2 mL, reading error: 1 mL, seed: 9, "
      "lid: { relief: 1 m, rating: 20 kPa, weight: 12 kg, ballast factor: 2 }, "
      "soak: 48 cm for 30 min, stop: after 2 h, also judge: [after 1 h, 3 readings within 5 %]"));
  CHECK(question.gauge.volume_division == Approx(2e-6));
  CHECK(question.gauge.random_error == Approx(1e-6));
  CHECK(question.gauge.head_division == Approx(1e-3));
  CHECK(question.gauge.head_tolerance == Approx(5e-3));
  CHECK(question.gauge.seed == 9);
  // The end of the test governs; rules count from the end of the soak.
  REQUIRE(question.rules.size() == 3);
  CHECK(question.rules[0].kind == models::StopKind::after_time);
  CHECK(question.rules[0].time == Approx(7200));
  CHECK(question.setup.duration == Approx(9000));
  CHECK(question.rules[2].kind == models::StopKind::change_within_share);
  CHECK(question.circumstances.lid->weight == Approx(12));
  CHECK(question.circumstances.ballast_factor == Approx(2));
  CHECK_FALSE(question.circumstances.sealed_volume);
  CHECK(question_of(case_of("head: 8 cm, stop: after 2 h")).rules.empty());
}

TEST_CASE("the true Kfs may be that of a named layer, at test temperature", "[question]") {
  const auto kfs = [](const std::string& more) {
    const Case what = read_case(
        "ringwright: 1\nground:\n  water: 0 degC\n  parameters: { theta_r: 0.05, theta_s: 0.4, "
        "alpha: 3 1/m, n: 1.6, Ks: 2 cm/h }\n  layers:\n    - { name: pan, from: 20 cm, "
        "parameters: { theta_r: 0.05, theta_s: 0.4, alpha: 3 1/m, n: 1.6, Ks: 0.5 cm/h } }\n" +
            more + "tests:\n  a: { ring: 20 cm, head: 5 cm, insert: 10 cm }\n",
        "x.yaml");
    return question_of(what).true_Kfs;
  };
  CHECK_FALSE(kfs(""));
  // Viscosity at 0 over that at 20 degC: 1.789 (IAPWS release on liquid water, from memory).
  CHECK(kfs("  true Kfs of: pan\n").value() == Approx(0.005 / 3600 / 1.789).epsilon(1e-3));
}

TEST_CASE("the resolved case holds programs, rings and layers in SI", "[question]") {
  const auto json = resolved_case(case_of(
      "outer ring: 40 cm, heads: 5 cm then 15 cm, soak: 5 cm for 30 min, stop: after 20 L"));
  const auto& test = json["tests"][0];
  CHECK(test["stages"].size() == 3);
  CHECK(test["stages"][0]["soak"] == true);
  CHECK(test["stages"][2]["head"]["value"].get<double>() == Approx(0.15));
  CHECK(test["outer"]["ring_radius"]["value"].get<double>() == Approx(0.20));
  CHECK(test["stop"]["rule"]["volume"]["value"].get<double>() == Approx(0.02));
  CHECK_FALSE(test.contains("lid"));
  CHECK(json["warnings"].empty());
}

}  // namespace ringwright::cases
