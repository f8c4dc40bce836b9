#include <algorithm>
#include <catch2/catch.hpp>
#include <numbers>
#include <string>

#include "cases/input/read_case.hpp"

namespace ringwright::cases {
namespace {

Case case_of(const std::string& keys, const std::string& common = "") {
  return read_case(
      "ringwright: 1\nground: { texture: loam, water: 10 degC }\ntests:\n  a test: { " + keys +
          " }\n" + common,
      "x.yaml");
}

bool assumes(const Case& result, const std::string& key) {
  return std::any_of(result.assumed.begin(), result.assumed.end(),
                     [&](const Assumption& a) { return a.key == key; });
}

}  // namespace

TEST_CASE("a double ring is as deep and as full outside as inside unless said", "[rings]") {
  const Case plain = case_of("inner ring: 30 cm, outer ring: 60 cm, insert: 10 cm, head: 5 cm");
  const Test& test = plain.tests[0];
  CHECK(test.ring.radius == Approx(0.15));
  REQUIRE(test.outer_ring);
  CHECK(test.outer_ring->radius == Approx(0.30));
  CHECK(test.outer_ring->insertion == Approx(0.10));
  CHECK(test.outer.stages.empty());
  CHECK(assumes(plain, "tests.a test.outer insert"));
  CHECK(assumes(plain, "tests.a test.outer head"));
}

TEST_CASE("a double ring with insertion and head of its own outside", "[rings]") {
  const Case own = case_of(
      "ring: 30 cm, outer ring: 60 cm, insert: 10 cm, head: 5 cm, outer insert: 15 cm, "
      "outer head: 10 cm");
  const Test& test = own.tests[0];
  CHECK(test.outer_ring->insertion == Approx(0.15));
  REQUIRE(test.outer.stages.size() == 1);
  CHECK(test.outer.stages[0].head == Approx(0.10));
  CHECK(test.program.stages.empty());
  CHECK_FALSE(assumes(own, "tests.a test.outer head"));
}

TEST_CASE("stages inside are those outside too", "[rings]") {
  const Test test =
      case_of("ring: 30 cm, outer ring: 60 cm, insert: 10 cm, heads: 5 cm then 15 cm").tests[0];
  REQUIRE(test.outer.stages.size() == 2);
  CHECK(test.outer.stages[1].head == test.program.stages[1].head);
  CHECK(test.outer.stages[1].duration == test.program.stages[1].duration);
}

TEST_CASE("a sealed inner ring holds its own volume", "[rings]") {
  const std::string liner =
      "inner ring: 1.5 m, outer ring: 3.6 m, insert: 12 cm, outer insert: 45 cm, head: 30 cm, "
      "sealed: inner ring";
  const Case plain = case_of(liner);
  // 1.5 m wide, 0.3 m deep.
  CHECK(plain.tests[0].sealed_volume.value() == Approx(std::numbers::pi * 0.5625 * 0.3));
  CHECK(assumes(plain, "tests.a test.sealed volume"));
  CHECK(plain.tests[0].reader.volume_division == Approx(1e-6));
  CHECK(case_of(liner + ", sealed volume: 400 L").tests[0].sealed_volume.value() == Approx(0.4));
}

TEST_CASE("the gauge is a volume or a level in a tube", "[rings]") {
  const std::string ring = "ring: 20 cm, insert: 10 cm, head: 5 cm";
  CHECK(case_of(ring + ", gauge: 10 mL").tests[0].reader.volume_division == Approx(1e-5));
  CHECK(case_of(ring + ", gauge: 1 mm in a 10 cm tube").tests[0].reader.volume_division ==
        Approx(1e-3 * std::numbers::pi * 0.0025));
  const Case silent = case_of(ring);
  CHECK(silent.tests[0].reader.volume_division > 0.0);
  CHECK(assumes(silent, "tests.a test.gauge"));
}

TEST_CASE("reading error and seed", "[rings]") {
  const std::string ring = "ring: 20 cm, insert: 10 cm, head: 5 cm";
  const Case noisy = case_of(ring, "  reading error: 5 mL\n  seed: 42\n");
  CHECK(noisy.tests[0].reader.random_error == Approx(5e-6));
  CHECK(noisy.tests[0].reader.seed == 42);
  CHECK_FALSE(assumes(noisy, "tests.a test.seed"));
  CHECK(assumes(case_of(ring + ", reading error: 5 mL"), "tests.a test.seed"));
}

TEST_CASE("stop rules of every kind", "[rings]") {
  const std::string ring = "ring: 20 cm, insert: 10 cm, head: 5 cm";
  const auto rule = [&](const std::string& stop) {
    return case_of(ring, "  stop: " + stop + "\n").tests[0].rule.value();
  };
  const auto amount = rule("4 readings within 6 mm/h, or 8 h");
  CHECK(amount.kind == models::StopKind::change_within_amount);
  CHECK(amount.readings == 4);
  CHECK(amount.amount == Approx(6.0 / 3.6e6));
  const auto volume = rule("after 20 L, or 8 h");
  CHECK(volume.kind == models::StopKind::after_volume);
  CHECK(volume.volume == Approx(0.02));
  const auto share = rule("5 readings within 10 %");
  CHECK(share.kind == models::StopKind::change_within_share);
  CHECK(share.share == Approx(0.10));
  const auto preset = rule("Four half-hour drops within a quarter inch, or 8 h");
  CHECK(preset.check_edition);
  // A quarter inch in half an hour.
  CHECK(preset.amount == Approx(0.00635 / 1800));
  CHECK(rule("six hours").time == Approx(6 * 3600));
}

TEST_CASE("further rules are judged beside the one that holds", "[rings]") {
  const Case result = case_of("ring: 20 cm, insert: 10 cm, head: 5 cm",
                              "  stop: after 6 h\n  also judge:\n    - 4 readings within 6 mm/h\n"
                              "    - after 20 L\n    - after 2 h\n");
  const auto& rules = result.tests[0].also_judge;
  REQUIRE(rules.size() == 3);
  CHECK(rules[1].kind == models::StopKind::after_volume);
  CHECK(rules[2].kind == models::StopKind::after_time);
  CHECK(rules[2].time == Approx(7200));
  CHECK_FALSE(result.tests[0].rule);
}

}  // namespace ringwright::cases
