/// Disturbed soil and a gap along the wall vanish as their width does.

#include <catch2/catch.hpp>
#include <cmath>

#include "solver/resolution.hpp"
#include "solver/steady_ring.hpp"
#include "tests/solver/soils.hpp"
#include "validation/layers/ring_flow.hpp"
#include "validation/order.hpp"

using namespace ringwright;
using namespace ringwright::solver;
using ringwright::validation::saturated_ring_flow;

namespace {

TestSetup loam_ring() {
  TestSetup s;
  s.soil = class_soil("loam");
  s.initial_head = -3.0;
  s.ring = {0.15, 0.05, 0.003};
  s.pond_head = 0.10;
  return s;
}

const Domain kGround{10.0, 10.0};

Resolution resolution_of(const TestSetup& s, double accuracy) {
  return resolution_for(s, accuracy, CurveTable(s.soil.curves).capillary_length(), 600.0);
}

}  // namespace

// Along the wall the gradient falls as rho^(-1/2) with the distance from the foot, so that a shell
// of width w changes the flow by w times the integral of 1/rho from w to d: as w ln(d / w), order 1
// but for the logarithm (0.8 between 8 and 0.25 mm).
TEST_CASE("disturbed soil along the wall: the flow of undisturbed ground at width 0",
          "[layers][steady][convergence]") {
  const std::vector<double> widths{8e-3, 4e-3, 2e-3, 1e-3, 5e-4, 2.5e-4};
  const TestSetup plain = loam_ring();
  const Resolution usual = resolution_of(plain, 0.01);
  const double without =
      steady_flow(plain, {.ring = 0.10}, usual, ground_materials(plain)).ring_flow;
  for (double factor : {0.2, 2.0}) {
    std::vector<double> differences;
    double last = 0.0;
    for (double w : widths) {
      TestSetup s = loam_ring(), same = loam_ring();
      s.disturbed = models::DisturbedSoil{w, factor};
      same.disturbed = models::DisturbedSoil{w, 1.0};
      const Resolution r = resolution_of(s, 0.01);
      last = steady_flow(s, {.ring = 0.10}, r, ground_materials(s)).ring_flow;
      const double undisturbed =
          steady_flow(same, {.ring = 0.10}, r, ground_materials(same)).ring_flow;
      differences.push_back(std::abs(last / undisturbed - 1));
    }
    CAPTURE(factor, differences, last / without, validation::measured_order(widths, differences));
    for (std::size_t i = 0; i + 1 < differences.size(); ++i)
      CHECK(differences[i + 1] < 0.7 * differences[i]);
    CHECK(validation::measured_order(widths, differences) > 0.7);
    CHECK(last / without == Approx(1.0).margin(0.01 + differences.back()));
  }
}

// What a gap of width w carries grows as w^3 (Poiseuille), and so does what it adds to the flow
// where that is little.
TEST_CASE("gap along the wall: the flow of whole ground at width 0",
          "[layers][steady][convergence]") {
  const std::vector<double> widths{2e-4, 1e-4, 5e-5, 2.5e-5, 1.25e-5, 6.25e-6};
  const TestSetup plain = loam_ring();
  const double without =
      saturated_ring_flow(plain, ground_materials(plain), kGround, resolution_of(plain, 0.01));
  std::vector<double> differences;
  double last = 0.0;
  for (double w : widths) {
    TestSetup s = loam_ring();
    s.gap = models::WallGap{w};
    const Resolution r = resolution_of(s, 0.01);
    std::vector<Material> materials = ground_materials(s);
    last = saturated_ring_flow(s, materials, kGround, r);
    materials.back() = materials.front();
    differences.push_back(last / saturated_ring_flow(s, materials, kGround, r) - 1);
  }
  CAPTURE(differences, last / without);
  const std::size_t n = widths.size();
  for (std::size_t i = 0; i + 1 < n; ++i) CHECK(differences[i + 1] < differences[i]);
  const double order = validation::measured_order({widths[n - 2], widths[n - 1]},
                                                  {differences[n - 2], differences[n - 1]});
  CHECK(order == Approx(3.0).margin(0.3));
  CHECK(last / without == Approx(1.0).margin(0.01));
}

// A gap that carries far more than the soil: a mesh whose cells are an eighth as large.
TEST_CASE("gap along the wall: the mesh for 1 % against a much finer one", "[layers][steady]") {
  for (double w : {2e-3, 5e-4, 1e-4}) {
    TestSetup s = loam_ring();
    s.gap = models::WallGap{w};
    const Resolution rough = resolution_of(s, 0.01);
    Resolution fine = rough.scaled(0.25);
    fine.splits = 1;
    const std::vector<Material> materials = ground_materials(s);
    const double ratio = saturated_ring_flow(s, materials, kGround, rough) /
                         saturated_ring_flow(s, materials, kGround, fine);
    CAPTURE(w, ratio);
    CHECK(std::abs(ratio - 1) < 0.01);
  }
}
