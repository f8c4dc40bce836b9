#include <fmt/format.h>

#include <catch2/catch.hpp>
#include <cmath>
#include <iostream>
#include <numbers>

#include "models/soil/capillary_length.hpp"
#include "models/soil/catalogue.hpp"
#include "models/soil/van_genuchten.hpp"
#include "models/theory/falling_head.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "solver/virtual_test.hpp"

using namespace ringwright;

namespace {

constexpr double kAccuracy = 0.0003;
constexpr double kAgreement = 0.01;

// A front as sharp as the curves allow.
models::Soil sharp_soil(double psi, double Ks, double n = 10.0) {
  return {std::make_shared<models::VanGenuchten>(1.0 / psi, n, 0.5, -psi), 0.05, 0.35, Ks, 0.0};
}

solver::TestSetup poured(const models::Soil& soil, double initial_head, double depth,
                         double longest) {
  solver::TestSetup s;
  s.soil = soil;
  s.initial_head = initial_head;
  s.ring = {0.10, 0.15};
  s.duration = longest;
  s.program.stages = {
      {.kind = models::StageKind::free_fall, .head = depth, .duration = longest, .ramp = 0.0}};
  return s;
}

solver::Resolution resolution_of(const solver::TestSetup& s, double accuracy) {
  const solver::CurveTable table(s.soil.curves);
  return solver::resolution_for(s, accuracy, table.capillary_length(), 0.05 * s.duration);
}

solver::TestRun run_at(const solver::TestSetup& s, double accuracy) {
  return solver::run_test(s, resolution_of(s, accuracy));
}

// A sharp front is only as exact as the cell it stands in, and it ends half way down the ring: the
// cells between surface and foot hardly grow.
solver::TestRun run_with_even_cells(const solver::TestSetup& s) {
  solver::Resolution r = resolution_of(s, kAccuracy);
  r.growth_inside = 1.03;
  return solver::run_test(s, r);
}

double emptied_at(const solver::TestRun& run) {
  for (const solver::Event& e : run.events)
    if (e.kind == solver::EventKind::emptied) return e.time;
  return 0.0;
}

}  // namespace

TEST_CASE("falling head in the ring: the Kfs put in comes back", "[falling_head]") {
  const double depth = 0.03;
  const auto reads = [&](double psi, double n) {
    const double Ks = 1e-6;
    const models::Soil soil = sharp_soil(psi, Ks, n);
    const double lambda = models::capillary_length(*soil.curves);
    const double dtheta = soil.theta_s - soil.water_content(-100.0);
    const models::FallingHead theory{Ks, lambda, dtheta, depth, 1.0};
    const double expected = models::falling_head_time(theory, depth);
    const solver::TestRun run = run_with_even_cells(poured(soil, -100.0, depth, 1.2 * expected));
    const double t = emptied_at(run);
    const double kfs = models::simplified_falling_head_kfs(depth, dtheta, lambda, t);
    std::cout << fmt::format(
        "sharp front, psi {:.0f} cm, n {:.0f}: bare after {:.0f} s, theory {:.0f} s, Kfs / Ks "
        "{:.4f}, "
        "{} steps, {} cells, balance {:.0e}\n",
        100 * psi, n, t, expected, kfs / Ks, run.statistics.steps, run.statistics.cells,
        run.statistics.balance_error);
    CHECK(run.statistics.balance_error < 1e-6);
    return kfs / Ks;
  };
  CHECK(std::abs(reads(0.20, 10.0) - 1) < kAgreement);
  CHECK(std::abs(reads(0.40, 10.0) - 1) < kAgreement);
  // where suction matters less the front is less sharp against it: a steeper soil is needed
  const double ten = reads(0.05, 10.0), twenty = reads(0.05, 20.0);
  CHECK(std::abs(twenty - 1) < kAgreement);
  CHECK(std::abs(twenty - 1) < std::abs(ten - 1));
}

TEST_CASE("falling head in a standpipe: the level follows the closed form", "[falling_head]") {
  const models::Soil soil = sharp_soil(0.30, 1e-8);
  const double lambda = models::capillary_length(*soil.curves);
  const double dtheta = soil.theta_s - soil.water_content(-100.0);
  const models::FallingHead theory{soil.Ks, lambda, dtheta, 0.50, 20.0};
  const double end = models::falling_head_time(theory, 0.02);
  solver::TestSetup s = poured(soil, -100.0, 0.50, end);
  const double area = std::numbers::pi * s.ring.radius * s.ring.radius;
  s.program.vessel = models::Vessel{area / 20.0, 0.0, 0.0};
  for (double I : {0.0025, 0.005, 0.01, 0.02})
    s.times.push_back(models::falling_head_time(theory, I));
  s.times.back() = end;
  const solver::TestRun run = run_at(s, kAccuracy);
  REQUIRE(run.samples.size() == 4);
  const double depths[] = {0.0025, 0.005, 0.01, 0.02};
  for (std::size_t k = 0; k < 4; ++k) {
    const solver::RingWater& w = run.samples[k].water;
    CAPTURE(run.samples[k].time, w.head);
    CHECK(w.soil / area == Approx(depths[k]).epsilon(kAgreement));
    CHECK(w.head == Approx(0.50 - 20.0 * w.soil / area).epsilon(1e-6));
  }
  CHECK(run.statistics.balance_error < 1e-6);
}

TEST_CASE("falling head: Ks changes the clock and nothing else", "[falling_head]") {
  const auto run = [](double factor) {
    const models::Soil soil = sharp_soil(0.10, factor * 1e-6);
    solver::TestSetup s = poured(soil, -3.0, 0.03, 2000.0 / factor);
    for (double share : {0.05, 0.2, 0.5, 1.0}) s.times.push_back(share * s.duration);
    return run_at(s, 0.01);
  };
  const solver::TestRun one = run(1.0), eight = run(8.0);
  REQUIRE(one.samples.size() == eight.samples.size());
  for (std::size_t k = 0; k < one.samples.size(); ++k) {
    CHECK(eight.samples[k].water.soil == Approx(one.samples[k].water.soil).epsilon(1e-9));
    CHECK(eight.samples[k].water.head == Approx(one.samples[k].water.head).epsilon(1e-9));
    CHECK(eight.samples[k].ring_flow == Approx(8.0 * one.samples[k].ring_flow).epsilon(1e-9));
  }
}

TEST_CASE("falling head in soils of the classes reads low", "[falling_head]") {
  for (const models::PublishedSoil& row : models::published_soils()) {
    if (row.source != "Carsel & Parrish 1988") continue;
    const models::Soil soil = models::make_soil(row);
    const double initial = -3.0;
    const double lambda = models::capillary_length(*soil.curves);
    const double dtheta = soil.theta_s - soil.water_content(initial);
    const double depth = std::min(0.03, 0.6 * 0.15 * dtheta);  // the front stays inside
    const double expected = models::falling_head_time({soil.Ks, lambda, dtheta, depth, 1.0}, depth);
    const solver::TestRun run = run_at(poured(soil, initial, depth, 3.0 * expected), 0.01);
    const double t = emptied_at(run);
    CAPTURE(row.texture, t, expected);
    REQUIRE(t > 0.0);
    const double reads = models::simplified_falling_head_kfs(depth, dtheta, lambda, t) / soil.Ks;
    std::cout << fmt::format("{}: {:.2f} cm poured, bare after {:.3g} h, Kfs / Ks {:.3f}\n",
                             row.texture, 100 * depth, t / 3600, reads);
    CHECK(reads < 1.0 + kAgreement);
  }
}
