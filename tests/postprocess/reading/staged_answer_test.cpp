/// Answers of tests with stages, two rings, and a supply that is real.

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>

#include "postprocess/reading/answer_question.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "tests/postprocess/reading/staged_question.hpp"

using namespace ringwright;
using namespace ringwright::postprocess;

namespace {

constexpr double kArea = std::numbers::pi * 0.10 * 0.10;

bool has(const Answer& a, FlagKind kind) {
  return std::any_of(a.flags.begin(), a.flags.end(),
                     [kind](const Flag& f) { return f.kind == kind; });
}

// To what the balance of a run is held to.
void check_balance(const WaterUse& w) {
  CHECK(w.supply.value ==
        Approx(w.soil.value + w.standing + w.evaporated + w.removed).epsilon(1e-6));
}

}  // namespace

TEST_CASE("answer of three stages: stages, pairs and water tell the same story", "[reading]") {
  const Answer a = answer(two_head_question());
  CHECK(a.accuracy_met);
  CHECK(a.ladder.empty());
  REQUIRE(a.stages.size() == 3);
  REQUIRE(a.pairs.size() == 2);
  double soil = 0.0;
  for (const StageReading& s : a.stages) {
    soil += s.soil_volume.value;
    CHECK(s.rate.value > s.steady_rate.value);  // dry ground: from above
    CHECK(s.rate.relative_error() <= 0.01);
    CHECK(s.rate_as_read == Approx(s.rate.value));
  }
  CHECK(soil == Approx(a.water.soil.value));
  CHECK(a.stages[2].steady_rate.value == a.stages[0].steady_rate.value);
  CHECK(a.steady_rate.value == a.stages[2].steady_rate.value);
  check_balance(a.water);
  CHECK(a.water.removed == Approx(kArea * 0.10).epsilon(1e-6));  // bailed down once
  CHECK(a.water.standing == Approx(kArea * 0.05));
  // the first low head still falls fast, which hides part of the rise
  CHECK(a.pairs[0].kfs.value < a.pairs[1].kfs.value);
  for (const HeadPair& p : a.pairs)
    CHECK(p.kfs.error <= 0.01 * std::max(p.kfs.value, a.question.setup.soil.Ks));
  // the step up is made by the supply within 5 s: 10 cm of water in that minute, and intake
  CHECK(a.water.peak_flow > kArea * 0.10 / 60.0);
  CHECK(a.water.peak_flow < kArea * 0.10 / 60.0 + 2 * a.stages[1].rate.value * kArea);
}

TEST_CASE("what is poured in before an unlimited supply runs is no peak of it", "[reading]") {
  Question q = two_head_question();
  q.setup.program.stages.resize(1);
  q.setup.duration = 1200.0;
  const Answer a = answer(q);
  CHECK(a.water.peak_flow == Approx(volume_at(a.run, 60.0) / 60.0));
  CHECK(a.filling_volume == Approx(kArea * 0.05));
}

TEST_CASE("what a crew misreads is in the record as read only", "[reading]") {
  Question q = two_head_question();
  const Answer exact = answer(q);
  q.gauge = {.volume_division = 5e-6,
             .random_error = 1e-6,
             .head_division = 1e-3,
             .head_tolerance = 5e-3,
             .seed = 3};
  const Answer read = answer(q);
  for (std::size_t k = 0; k < 2; ++k) {
    CHECK(read.pairs[k].kfs.value == exact.pairs[k].kfs.value);
    CHECK(read.pairs[k].kfs_as_read != Approx(exact.pairs[k].kfs.value).epsilon(1e-6));
  }
}

TEST_CASE("each rule is judged, the first one governs", "[reading]") {
  Question q = two_head_question();
  q.rules = {{.kind = models::StopKind::after_time, .time = 1800.0},
             {.kind = models::StopKind::after_time, .time = 900.0},
             {.kind = models::StopKind::after_volume, .volume = 1.0}};
  const Answer a = answer(q);
  CHECK(a.stop_rule_met);
  CHECK(a.record.readings.back().time == 1800.0);
  CHECK(a.stages.size() == 2);
  CHECK(a.stages[1].to == 1800.0);
  REQUIRE(a.verdicts.size() == 3);
  CHECK(a.verdicts[1].stop.value() == 900.0);
  CHECK_FALSE(a.verdicts[2].stop);
  // at 900 s in the first stage: the rate there over the steady one at 5 cm
  CHECK(a.verdicts[1].above_steady.value ==
        Approx(a.verdicts[1].rate.value / a.stages[0].steady_rate.value - 1));
  CHECK(a.verdicts[1].supply_volume.value ==
        Approx(volume_at(a.run, 900.0) + kArea * 0.05).epsilon(1e-6));
}

TEST_CASE("a fall has no steady rate, its volume is the drop of the level", "[reading]") {
  const Answer a = answer(fall_question());
  CHECK(a.accuracy_met);
  CHECK(a.steady_rate.value == 0.0);
  CHECK(a.time_to_steady.time == 0.0);
  REQUIRE(a.stages.size() == 1);
  CHECK(a.stages[0].head_from == 0.20);
  CHECK(a.stages[0].soil_volume.value ==
        Approx((0.20 - a.stages[0].head_to) * kArea).epsilon(1e-6));
  const models::Record& r = a.record;
  for (std::size_t i = 1; i < r.readings.size(); ++i)
    CHECK(r.readings[i].volume ==
          Approx((r.readings[i - 1].head - r.readings[i].head) * kArea).epsilon(1e-5));
}

TEST_CASE("evaporation is read as intake and is no water in the ground", "[reading]") {
  Question q = fall_question();
  q.setup.program.evaporation = 1e-6;  // [m/s], far more than any: to be seen
  const Answer a = answer(q);
  CHECK(a.water.evaporated == Approx(1e-6 * kArea * 3600.0).epsilon(1e-6));
  for (std::size_t i = 0; i < a.record.readings.size(); ++i)
    CHECK(a.as_read.readings[i].volume - a.record.readings[i].volume ==
          Approx(1e-6 * kArea * 300.0).epsilon(1e-6));
  check_balance(a.water);
}

TEST_CASE("a double ring: the inner ring reads less than alone, both are told", "[reading]") {
  Question q = double_ring_question();
  const Answer both = answer(q);
  q.setup.outer_ring.reset();
  const Answer alone = answer(q);
  CHECK(both.accuracy_met);
  REQUIRE(both.outer);
  REQUIRE(both.outer_water);
  CHECK(both.steady_rate.value < alone.steady_rate.value);
  CHECK(both.steady_rate.value > q.setup.soil.Ks);  // Lai & Ren 2007: above Ks all the same
  CHECK(both.outer->steady_rate.value > both.steady_rate.value);
  CHECK(both.outer->rate.value > both.outer->steady_rate.value);
  CHECK(both.outer->rate.relative_error() <= 0.01);
  CHECK_FALSE(both.ladder.empty());
  const double inner = std::numbers::pi * 0.15 * 0.15, outer = std::numbers::pi * 0.30 * 0.30;
  CHECK(both.water.standing == Approx(inner * 0.05));
  CHECK(both.outer_water->standing == Approx((outer - inner) * 0.05));
  check_balance(both.water);
  check_balance(*both.outer_water);
}

TEST_CASE("a supply that does not keep up is flagged, one that does is not", "[reading]") {
  Question q = two_head_question();
  q.setup.program.stages = {{.head = 0.05, .duration = 3600.0}};
  q.setup.program.supply.largest_rate = 2e-5;
  const Answer enough = answer(q);
  CHECK_FALSE(has(enough, FlagKind::supply_exceeded));
  CHECK(enough.water.peak_flow <= 2e-5);
  q.setup.program.supply.largest_rate = 0.5 * enough.steady_rate.value * kArea;
  const Answer little = answer(q);
  CHECK(has(little, FlagKind::supply_exceeded));
  CHECK(little.water.peak_flow == Approx(*q.setup.program.supply.largest_rate).epsilon(1e-3));
}

TEST_CASE("a reservoir that ends the test leaves the readings before", "[reading]") {
  Question q = two_head_question();
  q.setup.program.stages = {{.head = 0.05, .duration = 3600.0}};
  const Answer whole = answer(q);
  CHECK_FALSE(has(whole, FlagKind::reservoir_emptied));
  q.setup.program.supply.when_empty = models::WhenEmpty::stop;
  // empty between the fourth and the fifth reading
  q.setup.program.supply.reservoir =
      kArea * 0.05 + 0.5 * (volume_at(whole.run, 1200.0) + volume_at(whole.run, 1500.0));
  const Answer a = answer(q);
  CHECK(a.ended_early);
  CHECK(a.record.readings.size() == 4);
  CHECK(has(a, FlagKind::reservoir_emptied));
  CHECK(a.accuracy_met);
  q.setup.program.supply.reservoir = kArea * 0.05 + 1e-6;
  const Answer none = answer(q);
  CHECK(none.ended_early);
  CHECK(none.record.readings.empty());
  CHECK(has(none, FlagKind::reservoir_emptied));
}

TEST_CASE("readings are held against the layer at the foot, or what is named", "[reading]") {
  Question q = sandy_loam_question();
  q.find_influence = false;
  models::Layer band{0.02, q.setup.soil, -3.0, "band"};
  band.soil.Ks *= 0.5;
  q.setup.layers_below = {band};
  const Answer a = answer(q);
  CHECK(a.ladder.back().reads.rate_as_kfs.value ==
        Approx(a.ladder.back().rate.value / (0.5 * q.setup.soil.Ks)));
  q.true_Kfs = 1e-5;
  const Answer named = answer(q);
  CHECK(named.ladder.back().reads.rate_as_kfs.value ==
        Approx(named.ladder.back().rate.value / 1e-5));
}

// A ring that runs dry within the last reading has no rate there; asking for its accuracy would
// refine without end.
TEST_CASE("a ring that runs dry in the last reading is answered all the same", "[reading]") {
  Question q;
  q.setup.soil = solver::class_soil("loam");
  q.setup.initial_head = -3.0;
  q.setup.ring = {0.15, 0.10};
  q.setup.duration = 6 * 3600.0;
  q.setup.program.stages = {{.head = 0.10, .duration = q.setup.duration}};
  q.setup.program.supply.reservoir = 9e-3;
  q.setup.program.supply.largest_rate = 1e-3 / 60;
  q.reading_interval = 600.0;
  q.assumed_alpha_star = 12.0;
  q.find_influence = false;
  const Answer a = answer(q);
  CHECK(a.accuracy_met);
  CHECK(a.run.statistics.cells < 5000);
  CHECK(a.water.soil.value == Approx(9e-3).epsilon(0.01));
  CHECK(std::any_of(a.flags.begin(), a.flags.end(),
                    [](const Flag& f) { return f.kind == FlagKind::ring_emptied; }));
}
