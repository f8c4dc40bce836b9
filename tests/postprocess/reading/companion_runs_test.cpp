#include "postprocess/reading/companion_runs.hpp"

#include <catch2/catch.hpp>
#include <cstring>

#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "tests/postprocess/reading/ring_question.hpp"

using namespace ringwright;
using namespace ringwright::postprocess;

namespace {

solver::TestRun run_with(double volume_at_1, double volume_at_3) {
  solver::TestRun run;
  solver::Sample a, b;
  a.time = 1.0, a.ring_volume = volume_at_1;
  b.time = 3.0, b.ring_volume = volume_at_3;
  run.samples = {a, b};
  return run;
}

CompanionRuns made_runs() {
  CompanionRuns runs;
  runs.fine = run_with(10.0, 20.0);
  runs.coarse = run_with(9.5, 19.8);
  runs.loose = run_with(9.6, 19.4);
  runs.steady_fine.ring_flow = 4.0;
  runs.steady_coarse.ring_flow = 4.1;
  runs.floor = 0.002;
  return runs;
}

}  // namespace

TEST_CASE("a figure's error is mesh difference and time difference, added", "[reading]") {
  const CompanionRuns runs = made_runs();
  const Figure early = runs.soil_volume(1.0), late = runs.soil_volume(3.0);
  CHECK(early.value == 10.0);
  CHECK(early.error == Approx(0.5 + 0.1));  // differences count without sign
  CHECK(late.value == 20.0);
  CHECK(late.error == Approx(0.2 + 0.4));
}

TEST_CASE("the error of a flow comes from flows, not from volumes", "[reading]") {
  const Figure flow = made_runs().mean_flow(1.0, 3.0);
  // 5, 5.15, 4.9 in the three runs
  CHECK(flow.value == Approx(5.0));
  CHECK(flow.error == Approx(0.15 + 0.25));
  const Figure first = made_runs().mean_flow(0.0, 1.0);
  CHECK(first.value == Approx(10.0));
}

TEST_CASE("the steady flow has its own pair of runs", "[reading]") {
  const Figure steady = made_runs().steady_flow();
  CHECK(steady.value == 4.0);
  CHECK(steady.error == Approx(0.1));
}

TEST_CASE("flow over steady flow takes both from the same mesh", "[reading]") {
  const Figure above = made_runs().above_steady(1.0, 3.0);
  CHECK(above.value == Approx(0.25));
  const double fine = 5.0 / 4.0, coarse = 5.15 / 4.1, loose = 4.9 / 4.1;
  CHECK(above.error == Approx((coarse - fine) + (coarse - loose)));
}

TEST_CASE("a figure below 0 has an error above 0", "[reading]") {
  const Figure f =
      made_runs().figure([](const solver::TestRun& r) { return -r.samples[0].ring_volume; });
  CHECK(f.value == -10.0);
  CHECK(f.error == Approx(0.6));
  CHECK(f.relative_error() == Approx(0.06));
}

TEST_CASE("volumes are known at sampled times only", "[reading]") {
  const solver::TestRun run = run_with(10.0, 20.0);
  CHECK(volume_at(run, 0.0) == 0.0);
  CHECK(volume_at(run, 1.0) == 10.0);
  CHECK(volume_at(run, 3.0 * (1 + 1e-15)) == 20.0);  // a time that came about by rounding
  CHECK_THROWS_AS(volume_at(run, 2.0), std::out_of_range);
  CHECK_THROWS_AS(volume_at(run, 4.0), std::out_of_range);
  CHECK_THROWS_AS(volume_at({}, 1.0), std::out_of_range);
}

TEST_CASE("runs that agree by chance still have the error of the floor", "[reading]") {
  CompanionRuns runs = made_runs();
  runs.coarse = runs.loose = runs.fine;
  runs.steady_coarse = runs.steady_fine;
  CHECK(runs.soil_volume(3.0).error == Approx(0.04));
  CHECK(runs.mean_flow(1.0, 3.0).error == Approx(0.01));
  CHECK(runs.steady_flow().error == Approx(0.008));
  // of the ratio, not of its excess over 1
  CHECK(runs.above_steady(1.0, 3.0).error == Approx(0.002 * 1.25));
}

TEST_CASE("the floor of the error is a quarter of the accuracy asked for", "[reading]") {
  CHECK(error_floor(0.01) == Approx(0.0025));
  CHECK(error_floor(0.003) == Approx(0.00075));
}

TEST_CASE("companions differ from the fine run as they should", "[reading]") {
  const Question q = sandy_loam_question();
  solver::TestSetup setup = q.setup;
  setup.times = {600.0, setup.duration};
  setup.snapshots = {600.0};
  const auto table = std::make_shared<solver::CurveTable>(setup.soil.curves);
  const auto materials = solver::ground_materials(setup, table);
  const solver::Resolution r =
      solver::resolution_for(setup, 0.01, table->capillary_length(), 600.0);
  const CompanionRuns runs = run_companions({setup, materials, {{setup.pond_head}}}, r, 1, {});
  CHECK(runs.coarse.statistics.cells < 0.5 * runs.fine.statistics.cells);
  CHECK(runs.coarse.statistics.cells == runs.loose.statistics.cells);
  CHECK(runs.loose.statistics.steps < runs.coarse.statistics.steps);
  CHECK(runs.steady_coarse.cells < 0.5 * runs.steady_fine.cells);
  CHECK(runs.fine.snapshots.size() == 1);
  CHECK(runs.coarse.snapshots.empty());
  const Figure volume = runs.soil_volume(setup.duration);
  CHECK(volume.error > 0.0);
  CHECK(volume.relative_error() < 0.05);
}

TEST_CASE("a stopped fine run leaves what it had, whatever the threads", "[reading]") {
  const Question q = sandy_loam_question();
  solver::TestSetup setup = q.setup;
  setup.times = {60.0, 600.0, setup.duration};
  const auto table = std::make_shared<solver::CurveTable>(setup.soil.curves);
  const auto materials = solver::ground_materials(setup, table);
  const solver::Resolution r = solver::resolution_for(setup, 0.01, table->capillary_length(), 60.0);
  for (int threads : {1, 2}) {
    const CompanionRuns runs = run_companions({setup, materials, {{setup.pond_head}}}, r, threads,
                                              [](double t) { return t < 700.0; });
    CAPTURE(threads);
    CHECK(runs.fine.interrupted);
    CHECK(runs.fine.samples.size() == 2);
    CHECK(runs.coarse.samples.empty());
  }
}
