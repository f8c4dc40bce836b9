#include "postprocess/reading/flags/flags.hpp"

#include <algorithm>
#include <catch2/catch.hpp>
#include <numbers>
#include <optional>

#include "tests/postprocess/reading/staged_question.hpp"

using namespace ringwright;
using namespace ringwright::postprocess;

namespace {

/// A test of one stage at 10 cm for an hour, 1 mL/s into the ground, that raises no flag.
struct Quiet {
  Question question = two_head_question();
  solver::TestRun run;
  bool rule_met = true;

  Quiet() {
    question.setup.program.stages = {{.head = 0.10, .duration = 3600.0}};
    question.setup.ring.insertion = 0.10;
    for (int k = 1; k <= 12; ++k) {
      solver::Sample s;
      s.time = 300.0 * k;
      s.ring_volume = s.water.soil = 1e-6 * s.time;
      s.water.head = 0.10;
      run.samples.push_back(s);
    }
    run.ended = 3600.0;
  }

  std::vector<Flag> flags(double stop = 3600.0) const {
    const TestPlan plan = plan_of(question);
    return raise_flags({question, plan, run, stop, rule_met, 0.21});
  }
  std::optional<Flag> flag(FlagKind kind, double stop = 3600.0) const {
    const auto all = flags(stop);
    const auto it =
        std::find_if(all.begin(), all.end(), [kind](const Flag& f) { return f.kind == kind; });
    return it == all.end() ? std::nullopt : std::optional<Flag>(*it);
  }
};

models::Lid lid(double relief, double rating, double weight) {
  models::Lid made;
  made.relief_head = relief, made.rating = rating, made.weight = weight;
  return made;
}

solver::Event event(double time, solver::EventKind kind, double value, bool outer = false) {
  return {time, kind, outer, value};
}

}  // namespace

TEST_CASE("a quiet test raises no flag", "[reading]") { CHECK(Quiet().flags().empty()); }

TEST_CASE("flag: supply exceeded", "[reading]") {
  using solver::EventKind;
  Quiet t;
  t.question.setup.program.supply.largest_rate = 1.2e-6;
  t.run.events = {event(30.0, EventKind::head_reached, 0.10)};
  CHECK_FALSE(t.flag(FlagKind::supply_exceeded));
  SECTION("the head sags") {
    t.run.events.push_back(event(700.0, EventKind::head_lost, 0.097));
    t.run.samples[4].water.head = 0.06;
    const auto f = t.flag(FlagKind::supply_exceeded);
    REQUIRE(f);
    CHECK(f->value == Approx(0.04));
    CHECK(f->limit == 0.10);
    CHECK_FALSE(t.flag(FlagKind::supply_exceeded, 600.0));  // after the stop
  }
  SECTION("the head is never reached") {
    t.run.events.clear();
    for (auto& s : t.run.samples) s.water.head = 0.02;
    const auto f = t.flag(FlagKind::supply_exceeded);
    REQUIRE(f);
    CHECK(f->value == Approx(0.08));
  }
}

TEST_CASE("flag: reservoir emptied", "[reading]") {
  Quiet t;
  t.question.setup.program.supply.reservoir = 0.004;
  t.run.events = {event(2000.0, solver::EventKind::reservoir_empty, 0.004)};
  const auto f = t.flag(FlagKind::reservoir_emptied);
  REQUIRE(f);
  CHECK(f->value == 2000.0);
  CHECK(f->limit == 0.004);
  CHECK_FALSE(t.flag(FlagKind::reservoir_emptied, 1800.0));
  // a test that ends with its reservoir has its last reading before
  t.run.ended = 2000.0;
  CHECK(t.flag(FlagKind::reservoir_emptied, 1800.0));
}

TEST_CASE("flag: flow below the gauge", "[reading]") {
  Quiet t;  // 300 mL in a reading
  t.question.gauge.volume_division = 29e-6;
  CHECK_FALSE(t.flag(FlagKind::flow_below_gauge));
  t.question.gauge.volume_division = 31e-6;
  const auto f = t.flag(FlagKind::flow_below_gauge);
  REQUIRE(f);
  CHECK(f->value == Approx(300.0 / 31.0));
  CHECK(f->limit == 10.0);
}

TEST_CASE("flag: surfacing", "[reading]") {
  Quiet t;
  t.run.surfacing = {true, 900.0, 0.14, 5e-4};
  for (auto& s : t.run.samples) s.seepage_volume = 1e-7 * std::max(0.0, s.time - 900.0);
  const auto f = t.flag(FlagKind::surfacing);
  REQUIRE(f);
  CHECK(f->value == Approx(2.7e-4));
  CHECK(f->limit == 900.0);
  CHECK(f->place == 0.14);
  CHECK_FALSE(t.flag(FlagKind::surfacing, 600.0));
  for (auto& s : t.run.samples) s.seepage_volume *= 1e-3;  // a quarter of a millilitre
  CHECK_FALSE(t.flag(FlagKind::surfacing));
}

TEST_CASE("flag: ring emptied", "[reading]") {
  using solver::EventKind;
  Quiet t;
  t.run.events = {event(3000.0, EventKind::emptied, 0.0)};
  for (auto& s : t.run.samples) s.water.standing = s.time < 3000.0 ? 1e-3 : 0.0;
  const auto f = t.flag(FlagKind::ring_emptied);
  REQUIRE(f);
  CHECK(f->value == 3000.0);
  CHECK_FALSE(t.flag(FlagKind::ring_emptied, 2700.0));  // stopped before
  t.run.samples.back().water.standing = 1e-3;           // filled again
  CHECK_FALSE(t.flag(FlagKind::ring_emptied));
}

// H/(2 d) against (rho_s/rho_w - 1)(1 - porosity), Terzaghi's critical gradient; grains of 2650 and
// water of 998.2 kg/m3 at 20 degC (textbook); flagged from two thirds of it on (common practice, no
// source).
TEST_CASE("flag: piping", "[reading]") {
  Quiet t;
  const double critical = (2650.0 / 998.2 - 1.0) * (1.0 - t.question.setup.soil.theta_s) / 1.5;
  t.question.setup.program.stages[0].head = 0.99 * critical * 0.20;
  CHECK_FALSE(t.flag(FlagKind::piping));
  t.question.setup.program.stages[0].head = 1.01 * critical * 0.20;
  const auto f = t.flag(FlagKind::piping);
  REQUIRE(f);
  CHECK(f->value == Approx(1.01 * critical));
  CHECK(f->limit == Approx(critical));
  // the ring around it holds the water of both in
  t.question.setup.outer_ring = models::SingleRing{0.30, 0.20, 0.003};
  t.question.setup.outer_program = t.question.setup.program;
  CHECK_FALSE(t.flag(FlagKind::piping));
  t.question.setup.outer_ring->insertion = 0.05;
  REQUIRE(t.flag(FlagKind::piping));
  CHECK(t.flag(FlagKind::piping)->outer);
}

// At the foot: water under H + d against the soil's weight rho_b g d.
TEST_CASE("flag: fracture, under a lid", "[reading]") {
  Quiet t;
  t.question.setup.program.stages[0].head = 0.101;
  t.question.circumstances.bulk_density = 2000.0;  // breaks even at H = d = 10 cm
  CHECK_FALSE(t.flag(FlagKind::fracture));         // open
  t.question.circumstances.lid = lid(0.2, 0.3, 1e3);
  REQUIRE(t.flag(FlagKind::fracture));
  CHECK(t.flag(FlagKind::fracture)->value == Approx(0.201 / 0.2).epsilon(0.003));
  t.question.setup.program.stages[0].head = 0.099;
  CHECK_FALSE(t.flag(FlagKind::fracture));
}

TEST_CASE("flag: evaporation share", "[reading]") {
  Quiet t;
  for (auto& s : t.run.samples) s.water.evaporated = 0.09 * s.ring_volume;
  CHECK_FALSE(t.flag(FlagKind::evaporation_share));
  for (auto& s : t.run.samples) s.water.evaporated = 0.11 * s.ring_volume;
  REQUIRE(t.flag(FlagKind::evaporation_share));
  CHECK(t.flag(FlagKind::evaporation_share)->value == Approx(0.11));
}

TEST_CASE("flag: stop rule not met, and domain reached", "[reading]") {
  Quiet t;
  t.rule_met = false;
  REQUIRE(t.flag(FlagKind::stop_rule_not_met));
  CHECK(t.flag(FlagKind::stop_rule_not_met)->value == 0.21);
  CHECK_FALSE(t.flag(FlagKind::domain_reached));
  t.run.statistics.domain_reached = true;
  CHECK(t.flag(FlagKind::domain_reached));
}

TEST_CASE("flag: insertion as a share of the liner", "[reading]") {
  Quiet t;
  t.question.circumstances.liner = 0.31;
  CHECK_FALSE(t.flag(FlagKind::insertion_share));
  t.question.circumstances.liner = 0.29;
  REQUIRE(t.flag(FlagKind::insertion_share));
  CHECK(t.flag(FlagKind::insertion_share)->value == Approx(0.10 / 0.29));
}

// Water expands by 2.07e-4 per degC at 20 degC (textbook): 225 L change by 46.6 mL, so that a tenth
// of the daily flow is less below 466 mL a day.
TEST_CASE("flag: temperature of a sealed volume", "[reading]") {
  Quiet t;
  t.question.circumstances.sealed_volume = 0.225;
  const double per_day = 86400.0;
  for (auto& s : t.run.samples) s.ring_volume = 480e-6 / per_day * s.time;
  CHECK_FALSE(t.flag(FlagKind::sealed_temperature));
  for (auto& s : t.run.samples) s.ring_volume = 450e-6 / per_day * s.time;
  const auto f = t.flag(FlagKind::sealed_temperature);
  REQUIRE(f);
  CHECK(f->value == Approx(46.6e-6).epsilon(0.01));
  CHECK(f->limit == Approx(45e-6));
}

// 1 m of water on a disc of 20 cm: 308 N, which with the factor 1.5 take 47 kg.
TEST_CASE("flag: lift on a lid", "[reading]") {
  Quiet t;
  t.question.circumstances.lid = lid(1.0, 1.5, 48.0);
  t.question.circumstances.bulk_density = 4000.0;
  CHECK_FALSE(t.flag(FlagKind::lid_lift));
  t.question.circumstances.lid->weight = 45.0;
  const auto f = t.flag(FlagKind::lid_lift);
  REQUIRE(f);
  CHECK(f->value == Approx(308.0).epsilon(0.005));
  CHECK(f->limit == Approx(45.0 * 9.80665));
  CHECK(f->place == Approx(2.0).margin(0.3));  // 1.5 x 308 N / g - 45 kg
}

TEST_CASE("flag: a lid that is not for use", "[reading]") {
  Quiet t;
  t.question.circumstances.bulk_density = 4000.0;
  t.question.circumstances.lid = lid(0.5, 0.6, 1e3);
  CHECK(t.flags().empty());
  t.question.circumstances.lid->rating = 0.4;
  CHECK(t.flag(FlagKind::lid_not_for_use));
  t.question.circumstances.lid->rating.reset();
  CHECK(t.flag(FlagKind::lid_not_for_use));
  // nothing is known of the lid, but the water is pressed by air
  t.question.circumstances.lid.reset();
  CHECK_FALSE(t.flag(FlagKind::lid_not_for_use));
  t.question.setup.program.vessel = models::Vessel{.area = 0.0};
  CHECK(t.flag(FlagKind::lid_not_for_use));
}
