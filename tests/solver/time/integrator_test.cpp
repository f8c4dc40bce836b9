#include "solver/time/integrator.hpp"

#include <catch2/catch.hpp>
#include <cmath>
#include <numeric>

#include "solver/failure.hpp"
#include "solver/mesh/axisymmetric.hpp"
#include "solver/mesh/grading.hpp"
#include "tests/solver/flow_run.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

const Condition drain{Boundary::free_drainage, {}, false};

CellsAndFaces graded_column() { return column_mesh(graded_one_end(0.0, -3.0, 0.002, 1.1)); }

struct Unreachable {
  double time;
};

}  // namespace

TEST_CASE("steps end exactly at each stop and go on from there", "[solver][time]") {
  const models::Soil soil = class_soil("loam");
  FlowSystem flow(graded_column(), soil, std::make_shared<CurveTable>(soil.curves),
                  {Condition::constant(Boundary::head, 0.05), drain});
  Integrator integrator(flow, 1e-3);
  integrator.start(0.0, uniform_state(flow, -3.0));
  double before = 0.0;
  for (double stop : {60.0, 61.0, 61.5, 3600.0, 3600.001, 7200.0}) {
    while (integrator.time() < stop) {
      const double reached = integrator.step(stop);
      CHECK(reached == integrator.time());
      CHECK(reached > before);
      CHECK(reached <= stop);
      CHECK(integrator.last_step() == Approx(reached - before).epsilon(1e-12));
      before = reached;
    }
    CHECK(integrator.time() == stop);
    CHECK(integrator.step(stop) == stop);  // asked again at the stop: no harm
    std::vector<double> u(static_cast<std::size_t>(flow.cells()));
    integrator.u_at(stop, u);
    CHECK(std::equal(u.begin(), u.end(), integrator.u().begin()));
  }
}

TEST_CASE("water balance: stored plus out is zero within every step", "[solver][time]") {
  const models::Soil soil = class_soil("sandy loam");
  FlowSystem flow(graded_column(), soil, std::make_shared<CurveTable>(soil.curves),
                  {Condition::constant(Boundary::head, 0.10), drain});
  const std::vector<double> u = uniform_state(flow, -1.0);
  const double at_start = stored_water(flow, u);
  Integrator integrator(flow, 1e-3);
  integrator.start(0.0, u);
  std::vector<double> volumes(2), flows(2);
  while (integrator.time() < 7200.0) {
    const double before = integrator.time();
    integrator.step(7200.0);
    const double t = 0.3 * before + 0.7 * integrator.time();
    integrator.totals_at(t, volumes, flows);
    const double error = integrator.stored_at(t) - at_start + volumes[0] + volumes[1];
    CHECK(std::abs(error) <= 1e-6 * (std::abs(volumes[0]) + std::abs(volumes[1])));
  }
  CHECK(integrator.stored_at(7200.0) == Approx(stored_water(flow, integrator.u())).epsilon(1e-9));
}

TEST_CASE("an error thrown by a boundary value arrives unchanged", "[solver][time]") {
  const models::Soil soil = class_soil("loam");
  const Condition breaking{Boundary::head,
                           [](double t, double) {
                             if (t > 100.0) throw Unreachable{t};
                             return 0.05;
                           },
                           true};
  FlowSystem flow(graded_column(), soil, std::make_shared<CurveTable>(soil.curves),
                  {breaking, drain});
  Integrator integrator(flow, 1e-3);
  integrator.start(0.0, uniform_state(flow, -3.0));
  double thrown = 0.0;
  try {
    while (integrator.time() < 1000.0) integrator.step(1000.0);
  } catch (const Unreachable& e) {
    thrown = e.time;
  }
  CHECK(thrown > 100.0);
  CHECK(integrator.time() <= 100.0);
  // what was reached stays valid, and a new leg starts clean
  const double reached = integrator.time();
  const std::vector<double> u(integrator.u().begin(), integrator.u().end());
  integrator.start(0.0, u);
  CHECK(integrator.step(50.0) <= 50.0);
  CHECK(reached > 0.0);
}

// A closed column takes what its pores hold; no state exists after that.
TEST_CASE("water forced into a closed full column fails with time and worst cells",
          "[solver][time]") {
  const models::Soil soil = class_soil("loam");
  FlowSystem flow(column_mesh(equal_edges(0.0, -0.5, 50)), soil,
                  std::make_shared<CurveTable>(soil.curves),
                  {Condition::constant(Boundary::flux, 1e-6), {}});
  const std::vector<double> u = uniform_state(flow, -1.0);
  const double full =
      0.5 * (soil.theta_s - soil.theta_r) * (1 - soil.curves->saturation(-1.0)) / 1e-6;
  Integrator integrator(flow, 1e-3);
  integrator.start(0.0, u);
  bool failed = false;
  try {
    while (integrator.time() < 10 * full) integrator.step(10 * full);
  } catch (const SolverFailure& failure) {
    failed = true;
    CHECK(failure.time == Approx(full).epsilon(0.01));
    CHECK(failure.time == integrator.time());
    CHECK(failure.step > 0.0);
    CHECK(std::string(failure.what()).find("time step") != std::string::npos);
    REQUIRE(failure.worst.size() == 5);
    for (std::size_t i = 0; i + 1 < 5; ++i)
      CHECK(failure.worst[i].size >= failure.worst[i + 1].size);
    CHECK(failure.worst[0].cell >= 0);
    CHECK(failure.worst[0].cell < flow.cells());
  }
  CHECK(failed);
}

// Each of a million swings wants its own steps: the run is ended, with the time reached.
TEST_CASE("a run that creeps is ended after very many steps", "[solver][time]") {
  const models::Soil soil = class_soil("sand");
  const Condition shaking{Boundary::head,
                          [](double t, double) { return -0.3 + 0.25 * std::sin(2 * t); }, true};
  FlowSystem flow(column_mesh(equal_edges(0.0, -0.01, 3)), soil,
                  std::make_shared<CurveTable>(soil.curves), {shaking, {}});
  Integrator integrator(flow, 1e-4);
  integrator.start(0.0, uniform_state(flow, -0.3));
  bool failed = false;
  try {
    while (integrator.time() < 3e6) integrator.step(3e6);
  } catch (const SolverFailure& failure) {
    failed = true;
    CHECK(failure.time == integrator.time());
    CHECK(failure.time < 3e6);
    CHECK(std::string(failure.what()).find("steps") != std::string::npos);
  }
  CHECK(failed);
}

TEST_CASE("a boundary value that is not a number fails instead of running on", "[solver][time]") {
  const models::Soil soil = class_soil("loam");
  FlowSystem flow(graded_column(), soil, std::make_shared<CurveTable>(soil.curves),
                  {Condition::constant(Boundary::head, std::nan("")), drain});
  Integrator integrator(flow, 1e-3);
  integrator.start(0.0, uniform_state(flow, -3.0));
  CHECK_THROWS_AS(integrator.step(100.0), SolverFailure);
}

TEST_CASE("a smooth change of head needs no new leg", "[solver][time]") {
  const models::Soil soil = class_soil("loam");
  const Condition rising{Boundary::head,
                         [](double t, double) { return 0.05 + 0.05 * std::sin(1e-3 * t); }, true};
  FlowSystem flow(graded_column(), soil, std::make_shared<CurveTable>(soil.curves),
                  {rising, drain});
  const std::vector<double> u = uniform_state(flow, -3.0);
  const double before = stored_water(flow, u);
  const FlowRun coarse = run_flow(flow, 1e-3, u, {7200.0});
  const double after = stored_water(flow, coarse.records[0].u);
  const double out = coarse.records[0].volumes[0] + coarse.records[0].volumes[1];
  CHECK(after - before == Approx(-out).epsilon(1e-6));
  const FlowRun fine = run_flow(flow, 1e-5, u, {7200.0});
  CHECK(coarse.records[0].volumes[0] == Approx(fine.records[0].volumes[0]).epsilon(2e-3));
}
