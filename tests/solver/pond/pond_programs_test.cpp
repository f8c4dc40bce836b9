/// What is done with the water, carried out over a real soil.

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>

#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "solver/virtual_test.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

constexpr double kHour = 3600.0;
constexpr double kLitre = 1e-3;
constexpr double kAccuracy = 0.01;
constexpr double kBalance = 1e-6;
constexpr double kHeadKept = 3e-4;  // [m], a limited supply holds its head to this

// 30 cm ring, 5 cm into loam, 10 cm of water: fills with 7.07 L and drinks some 1.7 L/h later on.
TestSetup loam_ring(double hours, const char* texture = "loam") {
  TestSetup s;
  s.soil = class_soil(texture);
  s.initial_head = -3.0;
  s.ring = {0.15, 0.05};
  s.pond_head = 0.10;
  s.duration = hours * kHour;
  for (int k = 1; k <= 20; ++k) s.times.push_back(k * s.duration / 20);
  return s;
}

double area_of(const TestSetup& s) { return std::numbers::pi * s.ring.radius * s.ring.radius; }

TestSetup with_stages(TestSetup s, std::vector<models::Stage> stages) {
  s.program.stages = std::move(stages);
  return s;
}

TestRun run(const TestSetup& s) {
  const CurveTable table(s.soil.curves);
  return run_test(s, resolution_for(s, kAccuracy, table.capillary_length(), 0.05 * s.duration));
}

long count(const TestRun& run, EventKind kind) {
  return std::count_if(run.events.begin(), run.events.end(),
                       [kind](const Event& e) { return e.kind == kind; });
}

double first(const TestRun& run, EventKind kind) {
  for (const Event& e : run.events)
    if (e.kind == kind) return e.time;
  return -1.0;
}

void check_water(const TestRun& run) {
  for (const Sample& s : run.samples)
    for (const RingWater& w : {s.water, s.outer_water}) {
      CAPTURE(s.time, w.supply, w.soil, w.standing, w.evaporated, w.removed);
      CHECK(std::abs(w.supply - w.soil - w.standing - w.evaporated - w.removed) <=
            kBalance * (w.supply + 1e-9));
    }
  CHECK(run.statistics.balance_error <= kBalance);
}

}  // namespace

TEST_CASE("a limited supply fills the ring at its rate and then holds the head", "[solver][pond]") {
  TestSetup s = with_stages(loam_ring(4.0), {{.head = 0.10, .duration = 4 * kHour}});
  const TestRun free = run(s);
  s.program.supply.largest_rate = 20 * kLitre / kHour;
  const TestRun r = run(s);
  check_water(r);
  REQUIRE(count(r, EventKind::head_reached) == 1);
  CHECK(count(r, EventKind::head_lost) == 0);
  const double filled = first(r, EventKind::head_reached);
  // the ring's volume at the full rate, and what the soil drinks meanwhile
  CHECK(filled > area_of(s) * 0.10 / *s.program.supply.largest_rate);
  for (const Sample& sample : r.samples) {
    CAPTURE(sample.time);
    if (sample.time < filled) {
      CHECK(sample.water.supply ==
            Approx(*s.program.supply.largest_rate * sample.time).epsilon(1e-3));
    } else if (sample.time > 1.2 * filled) {
      CHECK(std::abs(sample.water.head - 0.10) < kHeadKept);
    }
  }
  // late the ring does not remember how it was filled
  CHECK(r.samples.back().ring_flow == Approx(free.samples.back().ring_flow).epsilon(0.01));
  CHECK(r.samples.back().ring_volume < free.samples.back().ring_volume);
}

TEST_CASE("a supply that never meets the demand is all drunk", "[solver][pond]") {
  TestSetup s = with_stages(loam_ring(6.0), {{.head = 0.10, .duration = 6 * kHour}});
  s.program.supply.largest_rate = 0.5 * kLitre / kHour;  // below Ks times the area
  const TestRun r = run(s);
  check_water(r);
  CHECK(count(r, EventKind::head_reached) == 0);
  for (const Sample& sample : r.samples) {
    CHECK(sample.water.head < 0.0);
    CHECK(sample.water.standing == 0.0);
    CHECK(sample.water.soil == Approx(0.5 * kLitre * sample.time / kHour).epsilon(1e-5));
  }
}

TEST_CASE("a generous supply is as good as a head given", "[solver][pond]") {
  for (const char* texture : {"sand", "loam", "clay"}) {
    TestSetup s = with_stages(loam_ring(2.0, texture), {{.head = 0.10, .duration = 2 * kHour}});
    const TestRun free = run(s);
    s.program.supply.largest_rate = 1.0;
    const TestRun r = run(s);
    check_water(r);
    CAPTURE(texture);
    CHECK(r.samples.back().ring_volume ==
          Approx(free.samples.back().ring_volume).epsilon(kAccuracy));
  }
}

TEST_CASE("a head is lost when the soil drinks more than the hose gives", "[solver][pond]") {
  // sand, 30 cm ring: by the one-head formula (Reynolds & Elrick 1990, capillary length 4.6 cm)
  // the steady flow is 31 L/h at 2 cm and 59 L/h at 20 cm; 45 L/h belong to 11 cm
  TestSetup s = with_stages(loam_ring(3.0, "sand"), {{.head = 0.02, .duration = 1 * kHour},
                                                     {.head = 0.20, .duration = 2 * kHour}});
  s.program.supply.largest_rate = 45 * kLitre / kHour;
  const TestRun r = run(s);
  check_water(r);
  CHECK(count(r, EventKind::head_reached) == 1);
  CHECK(r.samples.back().water.head > 0.08);
  CHECK(r.samples.back().water.head < 0.14);
  CHECK(r.samples.back().ring_flow == Approx(45 * kLitre / kHour).epsilon(0.01));
}

TEST_CASE("an empty reservoir: the test goes on, ends, or waits for the next", "[solver][pond]") {
  TestSetup s = with_stages(loam_ring(6.0), {{.head = 0.10, .duration = 6 * kHour}});
  s.program.supply.reservoir = 10 * kLitre;
  SECTION("goes on: the ring drinks itself empty") {
    const TestRun r = run(s);
    check_water(r);
    CHECK(count(r, EventKind::reservoir_empty) == 1);
    REQUIRE(count(r, EventKind::emptied) == 1);
    CHECK(first(r, EventKind::reservoir_empty) < first(r, EventKind::emptied));
    const RingWater& w = r.samples.back().water;
    CHECK(w.supply == Approx(10 * kLitre).epsilon(1e-5));
    CHECK(w.soil == Approx(10 * kLitre).epsilon(1e-4));
    CHECK(w.soil_flow == 0.0);
    CHECK(r.ended == s.duration);
  }
  SECTION("ends") {
    s.program.supply.when_empty = models::WhenEmpty::stop;
    const TestRun r = run(s);
    CHECK(count(r, EventKind::test_ended) == 1);
    CHECK(r.ended < s.duration);
    CHECK(r.ended == first(r, EventKind::reservoir_empty));
    CHECK(r.statistics.balance_error < 1e-6);
  }
  SECTION("waits") {
    s.program.supply.when_empty = models::WhenEmpty::refill;
    s.program.supply.refill_time = 600.0;
    const TestRun r = run(s);
    check_water(r);
    CHECK(count(r, EventKind::reservoir_brought) >= 1);
    CHECK(first(r, EventKind::reservoir_brought) ==
          Approx(first(r, EventKind::reservoir_empty) + 600.0));
    CHECK(r.samples.back().water.supply > 10 * kLitre);
    CHECK(std::abs(r.samples[14].water.head - 0.10) < kHeadKept);  // from the second one
  }
  SECTION("too small to fill the ring") {
    s.program.supply.reservoir = 5 * kLitre;
    const TestRun r = run(s);
    check_water(r);
    CHECK(first(r, EventKind::reservoir_empty) == 0.0);
    CHECK(r.samples.front().water.head < 5 * kLitre / area_of(s));
    CHECK(r.samples.back().water.soil == Approx(5 * kLitre).epsilon(1e-4));
  }
}

TEST_CASE("a falling level is filled up at its threshold", "[solver][pond]") {
  TestSetup s = with_stages(loam_ring(4.0), {{.kind = models::StageKind::free_fall,
                                              .head = 0.10,
                                              .duration = 4 * kHour,
                                              .ramp = 1.0,
                                              .refill_below = 0.08}});
  const TestRun r = run(s);
  check_water(r);
  const long refills = count(r, EventKind::refilled);
  CHECK(refills >= 3);
  for (const Sample& sample : r.samples) {
    CHECK(sample.water.head <= 0.10 + 1e-9);
    CHECK(sample.water.head >= 0.08 - 1e-4);
  }
  // each refill lifts the level by the 2 cm; what the soil drinks during the second of the ramp
  // comes on top
  const RingWater& w = r.samples.back().water;
  CHECK(w.supply ==
        Approx(area_of(s) * (0.10 + 0.02 * static_cast<double>(refills))).epsilon(1e-3));
}

TEST_CASE("a level that is not filled up ends on the bare ground", "[solver][pond]") {
  for (const char* texture : {"sand", "loam"}) {
    TestSetup s = with_stages(loam_ring(12.0, texture), {{.kind = models::StageKind::free_fall,
                                                          .head = 0.05,
                                                          .duration = 12 * kHour,
                                                          .ramp = 0.0}});
    const TestRun r = run(s);
    CAPTURE(texture);
    check_water(r);
    REQUIRE(count(r, EventKind::emptied) == 1);
    CHECK(r.samples.back().water.soil == Approx(area_of(s) * 0.05).epsilon(1e-4));
    CHECK(r.samples.back().ring_flow == 0.0);
  }
}

TEST_CASE("down a step by waiting or by bailing", "[solver][pond]") {
  const std::vector<models::Stage> stages = {{.head = 0.10, .duration = 2 * kHour},
                                             {.head = 0.05, .duration = 4 * kHour}};
  TestSetup s = with_stages(loam_ring(6.0), stages);
  const TestRun waited = run(s);
  s.program.stages[1].down = models::StepDown::bail;
  const TestRun bailed = run(s);
  check_water(waited);
  check_water(bailed);
  CHECK(waited.samples.back().water.removed == 0.0);
  CHECK(bailed.samples.back().water.removed == Approx(area_of(s) * 0.05).epsilon(1e-9));
  CHECK(std::abs(waited.samples.back().water.head - 0.05) < 1e-6);
  CHECK(bailed.samples.back().water.head == Approx(0.05).epsilon(1e-12));
  // in between the one who waits still has more water over the soil
  const Sample &after = waited.samples[7], &cut = bailed.samples[7];  // 24 min later
  CHECK(after.water.head > 0.055);
  CHECK(cut.water.head == Approx(0.05).epsilon(1e-12));
  CHECK(waited.samples.back().ring_flow ==
        Approx(bailed.samples.back().ring_flow).epsilon(kAccuracy));
  // the tank gives the waiting ring less: the soil drank what the other threw away
  CHECK(waited.samples.back().water.supply < bailed.samples.back().water.supply);
}

TEST_CASE("evaporation is supplied where a head is held and lowers a level that falls",
          "[solver][pond]") {
  const double daily = 0.005 / 86400.0;
  TestSetup s = with_stages(loam_ring(4.0), {{.head = 0.10, .duration = 4 * kHour}});
  const TestRun dry_air = run(s);
  s.program.evaporation = daily;
  const TestRun held = run(s);
  check_water(held);
  const double lost = daily * area_of(s) * s.duration;
  CHECK(held.samples.back().water.evaporated == Approx(lost).epsilon(1e-9));
  CHECK(held.samples.back().water.supply ==
        Approx(dry_air.samples.back().water.supply + lost).epsilon(1e-9));
  s.program.stages[0].kind = models::StageKind::free_fall;
  const TestRun falling = run(s);
  check_water(falling);
  const RingWater& half_way = falling.samples[9].water;  // water still stands
  REQUIRE(half_way.standing > 0.0);
  CHECK(half_way.evaporated == Approx(0.5 * lost).epsilon(1e-6));
}

TEST_CASE("an outer ring that runs empty for a while", "[solver][pond]") {
  TestSetup s = with_stages(loam_ring(3.0), {{.head = 0.10, .duration = 3 * kHour}});
  s.outer_ring = models::SingleRing{0.30, 0.05};
  s.outer_program.stages = s.program.stages;
  const TestRun well = run(s);
  s.outer_program.empty = {{0.5 * kHour, 1.0 * kHour}};
  const TestRun ill = run(s);
  check_water(well);
  check_water(ill);
  const double annulus = std::numbers::pi * (0.30 * 0.30 - 0.15 * 0.15);
  const auto at = [](const TestRun& r, double t) {
    return *std::find_if(r.samples.begin(), r.samples.end(),
                         [t](const Sample& x) { return x.time >= t * (1 - 1e-12); });
  };
  CHECK(at(ill, 0.9 * kHour).outer_water.removed == Approx(annulus * 0.10).epsilon(1e-9));
  CHECK(at(ill, 0.9 * kHour).outer_water.soil_flow == 0.0);
  // without its neighbour the inner ring gives to the side too
  CHECK(at(ill, 0.9 * kHour).water.soil_flow > 1.01 * at(well, 0.9 * kHour).water.soil_flow);
  CHECK(at(ill, 3 * kHour).outer_water.head == Approx(0.10));
  CHECK(at(ill, 3 * kHour).outer_water.soil_flow > 0.0);
}

TEST_CASE("a lidded ring: the level moves in the standpipe only", "[solver][pond]") {
  const double pipe = 20e-4;  // [m2]
  TestSetup s = with_stages(
      loam_ring(1.0), {{.head = 0.30, .duration = 0.5 * kHour},
                       {.head = 1.00, .duration = 0.5 * kHour, .down = models::StepDown::bleed}});
  s.program.vessel = models::Vessel{pipe, 0.10, area_of(s) * 0.10};
  const TestRun r = run(s);
  check_water(r);
  CHECK(r.samples[5].water.standing == Approx(area_of(s) * 0.10 + pipe * 0.20).epsilon(1e-9));
  CHECK(r.samples.back().water.standing == Approx(area_of(s) * 0.10 + pipe * 0.90).epsilon(1e-9));
}
