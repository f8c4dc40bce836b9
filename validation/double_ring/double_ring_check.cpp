#include <fmt/format.h>

#include <catch2/catch.hpp>
#include <cmath>
#include <iostream>
#include <numbers>

#include "models/soil/catalogue.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/ground_materials.hpp"
#include "solver/mesh/axisymmetric.hpp"
#include "solver/mesh/grading.hpp"
#include "solver/resolution.hpp"
#include "solver/steady_ring.hpp"
#include "solver/time/integrator.hpp"
#include "solver/virtual_test.hpp"

using namespace ringwright;

namespace {

constexpr double kAccuracy = 0.01;
constexpr double kHour = 3600.0, kLitre = 1e-3;

models::Soil class_soil(const char* texture) {
  for (const models::PublishedSoil& row : models::published_soils_of(texture))
    if (row.source == "Carsel & Parrish 1988") return models::make_soil(row);
  throw std::invalid_argument(texture);
}

double disc(double radius) { return std::numbers::pi * radius * radius; }

solver::TestSetup double_ring(const char* texture, double inner, double outer, double insertion) {
  solver::TestSetup s;
  s.soil = class_soil(texture);
  s.initial_head = -3.0;
  s.ring = {inner, insertion};
  s.outer_ring = models::SingleRing{outer, insertion};
  s.pond_head = 0.10;
  s.duration = 6 * kHour;
  for (int k = 1; k <= 24; ++k) s.times.push_back(0.25 * k * kHour);
  return s;
}

solver::Resolution resolution_of(const solver::TestSetup& s, double accuracy = kAccuracy) {
  const solver::CurveTable table(s.soil.curves);
  return solver::resolution_for(s, accuracy, table.capillary_length(), 0.05 * s.duration);
}

double steady_excess(const solver::TestSetup& s) {
  const auto flow = solver::steady_flow(s, {s.pond_head, s.pond_head}, resolution_of(s),
                                        solver::ground_materials(s));
  return flow.ring_flow / disc(s.ring.radius) / s.soil.Ks;
}

// Depth infiltrated by one-dimensional ground under the same head [m].
double column_depth(const solver::TestSetup& s) {
  const solver::CellsAndFaces mesh =
      solver::column_mesh(solver::graded_one_end(0.0, -6.0, 0.001, 1.03));
  std::vector<solver::Condition> conditions(mesh.patches.size());
  for (std::size_t k = 0; k < conditions.size(); ++k)
    conditions[k] = mesh.patches[k] == "top"
                        ? solver::Condition::constant(solver::Boundary::head, s.pond_head)
                        : solver::Condition{solver::Boundary::free_drainage, {}, false};
  solver::FlowSystem flow(mesh, solver::ground_materials(s), conditions);
  solver::Integrator integrator(flow, 2e-4);
  const std::vector<double> u(mesh.volume.size(), flow.u_of_head(0, s.initial_head));
  integrator.start(0.0, u);
  while (integrator.time() < s.duration) integrator.step(s.duration);
  std::vector<double> volumes(flow.totals().size()), flows(volumes.size());
  integrator.totals_at(s.duration, volumes, flows);
  const bool top_first = mesh.patches[0] == "top";
  return -volumes[top_first ? 0 : 1];
}

}  // namespace

TEST_CASE("double ring: the steady rate stays above Ks and falls with insertion and size",
          "[double_ring]") {
  for (const char* texture : {"sand", "sandy loam", "loam", "silt loam", "clay"}) {
    double before = 1e9;
    for (double insertion : {0.05, 0.10, 0.20}) {
      const double x = steady_excess(double_ring(texture, 0.15, 0.30, insertion));
      CAPTURE(texture, insertion, x, before);
      CHECK(x > 1.0);
      CHECK(x < before);
      before = x;
    }
    before = 1e9;
    for (double inner : {0.10, 0.15, 0.30}) {
      const double x = steady_excess(double_ring(texture, inner, 2 * inner, 0.10));
      CAPTURE(texture, inner, x, before);
      CHECK(x > 1.0);
      CHECK(x < before);
      before = x;
      std::cout << fmt::format("{} {:.0f}/{:.0f} cm, 10 cm deep: steady rate {:.3f} Ks\n", texture,
                               200 * inner, 400 * inner, x);
    }
  }
}

TEST_CASE("double ring 30/60 in loam: hours to steady and litres", "[double_ring]") {
  solver::TestSetup s = double_ring("loam", 0.15, 0.30, 0.10);
  s.duration = 24 * kHour;
  s.times.clear();
  for (int k = 1; k <= 96; ++k) s.times.push_back(0.25 * k * kHour);
  const solver::TestRun run = solver::run_test(s, resolution_of(s));
  const double steady = steady_excess(s) * s.soil.Ks * disc(s.ring.radius);
  double last = 0.0;
  for (const solver::Sample& x : run.samples)
    if (x.ring_flow > 1.05 * steady) last = x.time;
  const solver::Sample& six = run.samples[23];
  const double litres = (six.water.supply + six.outer_water.supply) / kLitre;
  std::cout << fmt::format(
      "double ring 30/60 in loam: within 5 % after {:.2f} h, {:.1f} L in 6 h\n", last / kHour,
      litres);
  CHECK(last >= 2 * kHour);
  CHECK(last <= 12 * kHour);
  CHECK(litres >= 50);
  CHECK(litres <= 90);
}

TEST_CASE("double ring: with a wide buffer the inner ring is a column", "[double_ring]") {
  for (const char* texture : {"sandy loam", "loam"}) {
    const double column = column_depth(double_ring(texture, 0.15, 0.30, 0.10));
    double before = 1e9;
    for (double outer : {0.25, 0.45, 1.0, 2.5}) {
      const solver::TestSetup s = double_ring(texture, 0.15, outer, 0.10);
      const solver::TestRun run = solver::run_test(s, resolution_of(s));
      const double excess = run.samples.back().ring_volume / disc(s.ring.radius) / column - 1;
      std::cout << fmt::format(
          "{} inner 30 cm, outer {:.0f} cm: {:+.2f} % over the column in 6 h\n", texture,
          200 * outer, 100 * excess);
      CAPTURE(texture, outer, excess);
      CHECK(excess < before + kAccuracy);
      before = excess;
    }
    CHECK(std::abs(before) < kAccuracy);
  }
}

TEST_CASE("double ring: equal heads and insertions drink as one large ring", "[double_ring]") {
  for (const char* texture : {"sand", "loam", "clay"}) {
    const solver::TestSetup two = double_ring(texture, 0.15, 0.30, 0.10);
    solver::TestSetup one = two;
    one.ring = *two.outer_ring;
    one.outer_ring.reset();
    const solver::TestRun a = solver::run_test(two, resolution_of(two));
    const solver::TestRun b = solver::run_test(one, resolution_of(one));
    for (std::size_t k = 1; k < a.samples.size(); ++k) {
      const double both = a.samples[k].water.soil + a.samples[k].outer_water.soil;
      CAPTURE(texture, a.samples[k].time, both / b.samples[k].water.soil - 1);
      CHECK(both == Approx(b.samples[k].water.soil).epsilon(2 * kAccuracy));
    }
    CHECK(a.samples.back().water.soil + a.samples.back().outer_water.soil ==
          Approx(b.samples.back().water.soil).epsilon(kAccuracy));
  }
}
