#include <algorithm>
#include <catch2/catch.hpp>
#include <numbers>
#include <string>

#include "cases/input/read_case.hpp"

namespace ringwright::cases {
namespace {

using models::StageKind;

const std::string top =
    "ringwright: 1\nground:\n  texture: silt loam, moist\n  water: 10 degC\ntests:\n"
    "  a test:\n    ring: 20 cm\n    insert: 10 cm\n";

Case case_of(const std::string& keys, const std::string& common = "") {
  std::string text = top;
  std::size_t from = 0;
  while (from < keys.size()) {
    const std::size_t end = std::min(keys.find('\n', from), keys.size());
    text += "    " + keys.substr(from, end - from) + "\n";
    from = end + 1;
  }
  return read_case(text + common, "x.yaml");
}

Test test_of(const std::string& keys, const std::string& common = "") {
  return case_of(keys, common).tests.at(0);
}

bool assumes(const Case& result, const std::string& key, const std::string& text) {
  return std::any_of(result.assumed.begin(), result.assumed.end(), [&](const Assumption& a) {
    return a.key == key && a.text.find(text) != std::string::npos;
  });
}

const double disc_20 = std::numbers::pi * 0.01;  // area of a ring 20 cm wide [m2]

}  // namespace

TEST_CASE("one constant head needs no stages", "[program]") {
  const Test test = test_of("head: 5 cm");
  CHECK(test.program.stages.empty());
  CHECK(test.protocol.head == Approx(0.05));
  CHECK_FALSE(test.outer_ring);
}

TEST_CASE("heads follow each other, each for its time, as often as said", "[program]") {
  const Test test = test_of("heads: 5 cm then 15 cm, each for 20 min, 2 times");
  REQUIRE(test.program.stages.size() == 4);
  CHECK(test.program.stages[2].head == Approx(0.05));
  CHECK(test.program.stages[3].head == Approx(0.15));
  for (const auto& stage : test.program.stages) CHECK(stage.duration == Approx(1200));
  CHECK(test.protocol.longest == Approx(4800));
  CHECK(test.protocol.head == Approx(0.05));
  CHECK_FALSE(test.rule);
}

TEST_CASE("heads in either order and number, each with a time of its own", "[program]") {
  const Test test = test_of("heads: 15 cm for 1 h 10 min then 5 cm for 2 h then 10 cm for 30 min");
  REQUIRE(test.program.stages.size() == 3);
  CHECK(test.program.stages[0].head == Approx(0.15));
  CHECK(test.program.stages[0].duration == Approx(4200));
  CHECK(test.program.stages[1].duration == Approx(7200));
  CHECK(test.program.stages[1].down == models::StepDown::fall);
}

TEST_CASE("heads without a time share that of the test", "[program]") {
  const Case result = case_of("heads: 5 cm then 15 cm", "  stop: 3 readings within 5 %, or 3 h\n");
  const Test& test = result.tests[0];
  REQUIRE(test.program.stages.size() == 2);
  CHECK(test.program.stages[0].duration == Approx(5400));
  CHECK(test.protocol.longest == Approx(10800));
  CHECK(test.rule->readings == 3);
  CHECK(assumes(result, "tests.a test.heads", "each for 90 min"));
}

TEST_CASE("a soak comes first and makes the test longer", "[program]") {
  const Test test = test_of("soak: 2 cm for 30 min\nhead: 5 cm\nstop: after 2 h");
  REQUIRE(test.program.stages.size() == 2);
  CHECK(test.program.stages[0].soak);
  CHECK(test.program.stages[0].head == Approx(0.02));
  CHECK(test.program.stages[0].duration == Approx(1800));
  CHECK_FALSE(test.program.stages[1].soak);
  CHECK(test.program.stages[1].duration == Approx(7200));
  CHECK(test.protocol.longest == Approx(9000));
  CHECK(test.protocol.head == Approx(0.05));
}

TEST_CASE("the list of stages holds everything in a row", "[program]") {
  const Test test = test_of(
      "stages:\n  - { soak: 3 cm, for: 10 min }\n  - { head: 10 cm, for: 20 min, ramp: 30 s }\n"
      "  - { fall: from 10 cm, for: 40 min, refill below: 6 cm }\n"
      "  - { head: 4 cm, for: 1 h, step down: bail }\nread: every 5 min");
  const auto& stages = test.program.stages;
  REQUIRE(stages.size() == 4);
  CHECK(stages[0].soak);
  CHECK(stages[1].ramp == Approx(30));
  CHECK(stages[2].kind == StageKind::free_fall);
  CHECK(stages[2].refill_below.value() == Approx(0.06));
  CHECK(stages[2].ramp == Approx(5));
  CHECK(stages[3].down == models::StepDown::bail);
  CHECK(test.protocol.longest == Approx(600 + 1200 + 2400 + 3600));
  CHECK(test.protocol.head == Approx(0.10));
}

TEST_CASE("a fall to a level ends when so much has gone into the ground", "[program]") {
  const Test test = test_of("fall: from 10 cm to 4 cm\nstop: after 6 h");
  REQUIRE(test.program.stages.size() == 1);
  CHECK(test.program.stages[0].kind == StageKind::free_fall);
  CHECK(test.program.stages[0].duration == Approx(6 * 3600));
  REQUIRE(test.rule);
  CHECK(test.rule->kind == models::StopKind::after_volume);
  CHECK(test.rule->volume == Approx(disc_20 * 0.06));
  const Test three = test_of("fall: from 10 cm to 4 cm, 3 times");
  CHECK(three.program.stages[0].refill_below.value() == Approx(0.04));
  CHECK(three.rule->volume == Approx(3 * disc_20 * 0.06));
}

TEST_CASE("a fall in a tank beside the ring moves both levels", "[program]") {
  const Test test = test_of("fall: from 10 cm to 4 cm\nfalls in: tank 40 cm wide");
  CHECK(test.vessel == VesselKind::tank);
  CHECK(test.rule->volume == Approx((disc_20 + std::numbers::pi * 0.04) * 0.06));
}

TEST_CASE("pressure comes on top of the depth under a lid", "[program]") {
  const Test test = test_of(
      "head: 8 cm\npressure: 32 cm then 92 cm, each for 1 h\npressed by: standpipe 5 cm wide\n"
      "lid: { seal: 22 cm, relief: 1.2 m, rating: 20 kPa, weight: 30 kg }");
  REQUIRE(test.program.stages.size() == 2);
  CHECK(test.program.stages[0].head == Approx(0.40));
  CHECK(test.program.stages[1].head == Approx(1.00));
  REQUIRE(test.lid);
  CHECK(test.lid->underside == Approx(0.08));
  CHECK(test.lid->seal_radius.value() == Approx(0.11));
  CHECK(test.lid->weight == Approx(30));
  // 20 kPa / (998.207 kg/m3 * 9.80665 m/s2)
  CHECK(test.lid->rating.value() == Approx(2.04309).epsilon(1e-5));
  CHECK(test.vessel == VesselKind::standpipe);
  CHECK(test.vessel_diameter == Approx(0.05));
  CHECK(models::is_stated_safe(*test.lid));
}

TEST_CASE("a lower head under a lid is bled by default", "[program]") {
  const Test test = test_of(
      "heads: 60 cm then 30 cm, each for 1 h\npressed by: air\n"
      "lid: { depth: 10 cm, relief: 1 m, rating: 20 kPa }");
  CHECK(test.program.stages[1].down == models::StepDown::bleed);
  CHECK(test.lid->by_air);
}

TEST_CASE("a lid without relief and rating is warned of", "[program]") {
  const Case silent = case_of("head: 8 cm\npressure: 32 cm\nlid: { weight: 30 kg }");
  REQUIRE(silent.warnings.size() == 1);
  CHECK(silent.warnings[0].text.starts_with("relief and rating"));
  CHECK(case_of("head: 8 cm\npressure: 32 cm\nlid: { relief: 1 m, rating: 20 kPa }")
            .warnings.empty());
}

TEST_CASE("supply, reservoir and what happens when it is empty", "[program]") {
  const Test test = test_of("head: 5 cm\nwhen empty: refilled in 20 min",
                            "  supply: 6 L/min\n  reservoir: 50 L\n");
  const models::Supply& supply = test.program.supply;
  CHECK(supply.largest_rate.value() == Approx(1e-4));
  CHECK(supply.reservoir.value() == Approx(0.05));
  CHECK(supply.when_empty == models::WhenEmpty::refill);
  CHECK(supply.refill_time == Approx(1200));
  REQUIRE(test.program.stages.size() == 1);
  CHECK(test.program.stages[0].duration == Approx(8 * 3600));
}

TEST_CASE("a reservoir that does not fill the ring is warned of, not refused", "[program]") {
  // 20 cm wide, 5 cm deep: 1.571 L.
  CHECK(case_of("head: 5 cm\nreservoir: 1.5 L").warnings.size() == 1);
  CHECK(case_of("head: 5 cm\nreservoir: 1.6 L").warnings.empty());
}

TEST_CASE("an incident is a time without water in one of the rings", "[program]") {
  const Test test = test_of(
      "outer ring: 40 cm\nhead: 5 cm\nincident:\n"
      "  - outer ring empty from 1 h 10 min to 1 h 40 min\n  - ring empty from 2 h to 2 h 5 min");
  REQUIRE(test.outer.empty.size() == 1);
  CHECK(test.outer.empty[0].from == Approx(4200));
  CHECK(test.outer.empty[0].to == Approx(6000));
  REQUIRE(test.program.empty.size() == 1);
  CHECK(test.program.empty[0].to == Approx(7500));
}

}  // namespace ringwright::cases
