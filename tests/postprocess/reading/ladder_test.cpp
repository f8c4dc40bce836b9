#include "postprocess/reading/ladder.hpp"

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>

#include "models/soil/capillary_length.hpp"
#include "postprocess/reading/test_times.hpp"
#include "tests/postprocess/reading/ring_question.hpp"

using namespace ringwright;
using namespace ringwright::postprocess;

namespace {

constexpr double kArea = std::numbers::pi * 0.10 * 0.10;
constexpr double kSteadyFlow = 4e-7;  // [m3/s]

Question gardner_question() {
  Question q = sandy_loam_question();
  q.setup.soil = solver::gardner_soil(5.0);  // lambda 0.2 m
  return q;
}

// Volume of an infiltration whose flow falls to kSteadyFlow like 1/sqrt(t).
solver::TestRun made_run(const Question& q, double share) {
  std::vector<double> times;
  for (double t : stopping_times(q.reading_interval, q.setup.duration)) {
    times.push_back(t);
    times.push_back(t - q.reading_interval);
  }
  for (double t : reading_times(q.reading_interval, q.setup.duration)) times.push_back(t);
  std::sort(times.begin(), times.end());
  times.erase(std::unique(times.begin(), times.end()), times.end());
  solver::TestRun run;
  for (double t : times) {
    if (t <= 0.0) continue;
    solver::Sample s;
    s.time = t;
    s.ring_volume = share * (kSteadyFlow * t + 2e-5 * std::sqrt(t));
    run.samples.push_back(s);
  }
  return run;
}

CompanionRuns made_runs(const Question& q) {
  CompanionRuns runs;
  runs.fine = made_run(q, 1.0);
  runs.coarse = made_run(q, 1.004);
  runs.loose = made_run(q, 1.003);
  runs.steady_fine.ring_flow = kSteadyFlow;
  runs.steady_coarse.ring_flow = 1.002 * kSteadyFlow;
  runs.floor = 0.002;
  return runs;
}

const LadderRow& row_at(const Ladder& ladder, double time) {
  const auto it = std::find_if(ladder.rows.begin(), ladder.rows.end(),
                               [time](const LadderRow& r) { return r.time == time; });
  REQUIRE(it != ladder.rows.end());
  return *it;
}

}  // namespace

TEST_CASE("a row of the ladder, by hand", "[reading]") {
  const Question q = gardner_question();
  const Ladder ladder = make_ladder(q, made_runs(q), 3600.0);
  const LadderRow& row = row_at(ladder, 3600.0);
  // V = 4e-7 t + 2e-5 sqrt(t) at 3600 and 3240 s, over 360 s
  CHECK(row.soil_volume.value == Approx(2.64e-3));
  CHECK(row.rate.value == Approx((2.64e-3 - (1.296e-3 + 2e-5 * std::sqrt(3240.0))) / 360 / kArea));
  // all flows differ alike: 0.4 % mesh, 0.1 % time
  CHECK(row.soil_volume.relative_error() == Approx(0.005));
  CHECK(row.rate.relative_error() == Approx(0.005));
  // the filling adds volume, no error: pi 0.1^2 0.05 m3
  CHECK(row.supply_volume.value == Approx(2.64e-3 + 1.5707963e-3));
  CHECK(row.supply_volume.error == row.soil_volume.error);
  CHECK(row.above_steady.value == Approx(row.rate.value * kArea / kSteadyFlow - 1));
}

// Reynolds & Elrick 1990, Soil Sci. Soc. Am. J. 54:1233: i/Kfs = 1 + (H + 1/alpha*)/(pi a G),
// G = 0.316 d/a + 0.184.
TEST_CASE("a row reads Kfs by the published formulas", "[reading]") {
  const Question q = gardner_question();
  const Ladder ladder = make_ladder(q, made_runs(q), 3600.0);
  const double Ks = 1e-5;
  const double length = 3.14159265 * 0.10 * 0.342;  // pi a (0.316 x 0.5 + 0.184)
  const auto agrees = [&](const ReadsX& reads, const Figure& rate) {
    CHECK(reads.rate_as_kfs.value == Approx(rate.value / Ks));
    CHECK(reads.one_head.value == Approx(rate.value / Ks / (1 + (0.05 + 1 / 12.0) / length)));
    CHECK(reads.one_head_own_lambda.value ==
          Approx(rate.value / Ks / (1 + (0.05 + 0.2) / length)).epsilon(1e-5));
    for (const Figure* f : {&reads.rate_as_kfs, &reads.one_head, &reads.one_head_own_lambda})
      CHECK(f->relative_error() == Approx(rate.relative_error()));
  };
  for (const LadderRow& row : ladder.rows) agrees(row.reads, row.rate);
  agrees(ladder.steady_reads, ladder.steady_rate);
  CHECK(ladder.steady_rate.value == Approx(kSteadyFlow / kArea));
  CHECK(ladder.steady_rate.relative_error() == Approx(0.002));
}

TEST_CASE("rows ascend, the flow falls to steady from above, one row stops", "[reading]") {
  const Question q = gardner_question();
  for (double stop : {1080.0, 3600.0, 5040.0, 7200.0}) {
    const Ladder ladder = make_ladder(q, made_runs(q), stop);
    CAPTURE(stop);
    int stops = 0;
    for (std::size_t i = 0; i < ladder.rows.size(); ++i) {
      const LadderRow& row = ladder.rows[i];
      stops += row.stops_here;
      CHECK(row.stops_here == (row.time == stop));
      CHECK(row.above_steady.value > 0.0);
      if (i == 0) continue;
      CHECK(row.time > ladder.rows[i - 1].time);
      CHECK(row.soil_volume.value > ladder.rows[i - 1].soil_volume.value);
      CHECK(row.rate.value < ladder.rows[i - 1].rate.value);
    }
    CHECK(stops == 1);
    CHECK(ladder.rows.back().time == 7200.0);
  }
}

TEST_CASE("a flow below the steady one is shown with its sign", "[reading]") {
  const Question q = gardner_question();
  CompanionRuns runs = made_runs(q);
  runs.steady_fine.ring_flow = runs.steady_coarse.ring_flow = 2 * kSteadyFlow;
  const Ladder ladder = make_ladder(q, runs, 7200.0);
  CHECK(row_at(ladder, 7200.0).above_steady.value < 0.0);
  CHECK(row_at(ladder, 7200.0).above_steady.error > 0.0);
}

TEST_CASE("the worst figure is the worst of those promised", "[reading]") {
  const Question q = gardner_question();
  CompanionRuns runs = made_runs(q);
  const double stop = 7200.0;
  const Ladder even = make_ladder(q, runs, stop);
  CHECK(even.worst.relative_error >= Approx(0.005));
  CHECK(even.worst.mesh_part >= Approx(0.004));
  CHECK(even.worst.time_part == Approx(0.001));

  SECTION("a rate before 25 % of the stop promises nothing") {
    runs.coarse.samples.front().ring_volume *= 1.2;  // 240 s: only in the rate at 600 s
    REQUIRE(runs.coarse.samples.front().time < 360.0);
    CHECK(make_ladder(q, runs, stop).worst.relative_error == Approx(even.worst.relative_error));
  }
  SECTION("the last volume counts") {
    runs.coarse.samples.back().ring_volume *= 1.01;
    CHECK(make_ladder(q, runs, stop).worst.relative_error > even.worst.relative_error + 0.009);
  }
  SECTION("the steady flow counts") {
    runs.steady_coarse.ring_flow = 1.03 * kSteadyFlow;
    const WorstFigure worst = make_ladder(q, runs, stop).worst;
    CHECK(worst.relative_error >= Approx(0.03));
    CHECK(worst.mesh_part >= Approx(0.03));
  }
  SECTION("the ratio of flow to steady flow counts") {
    runs.coarse = made_run(q, 0.996);                    // flow 0.4 % down,
    runs.loose = runs.coarse;                            // steady flow 0.6 % up:
    runs.steady_coarse.ring_flow = 1.006 * kSteadyFlow;  // the ratio is off by 1 %
    CHECK(make_ladder(q, runs, stop).worst.relative_error > 0.0095);
  }
}
