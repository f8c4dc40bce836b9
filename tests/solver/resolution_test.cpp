#include "solver/resolution.hpp"

#include <catch2/catch.hpp>
#include <cmath>

#include "models/soil/catalogue.hpp"
#include "solver/domain.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

TestSetup loam(double radius, double insertion) {
  TestSetup setup;
  setup.soil = models::make_soil(models::published_soils_of("loam").front());
  setup.initial_head = -3.0;
  setup.ring = {radius, insertion};
  setup.pond_head = 0.05;
  setup.duration = 4 * 3600.0;
  return setup;
}

constexpr double kLambda = 0.11;

}  // namespace

TEST_CASE("finer for a higher accuracy, in every respect", "[solver]") {
  const TestSetup setup = loam(0.15, 0.05);
  const Resolution rough = resolution_for(setup, 0.01, kLambda, 720.0);
  const Resolution fine = resolution_for(setup, 0.003, kLambda, 720.0);
  CHECK(fine.tip_cell < rough.tip_cell);
  CHECK(fine.top_cell < rough.top_cell);
  CHECK(fine.growth < rough.growth);
  CHECK(fine.growth_down < rough.growth_down);
  CHECK(fine.growth_inside < rough.growth_inside);
  CHECK(fine.theta_tolerance < rough.theta_tolerance);
}

TEST_CASE("cells at the foot fit the wall, the radius and the capillary length", "[solver]") {
  for (double radius : {0.03, 0.1, 0.5})
    for (double insertion : {0.005, 0.05, 0.2}) {
      const Resolution r = resolution_for(loam(radius, insertion), 0.05, kLambda, 720.0);
      CHECK(r.tip_cell <= insertion / 2);
      CHECK(r.tip_cell <= radius / 4);
      CHECK(r.tip_cell <= kLambda / 2);
    }
  CHECK(resolution_for(loam(0.15, 0.0), 0.05, kLambda, 720.0).tip_cell <= 0.003 / 2);
}

TEST_CASE("the tolerance follows the water the soil can still take", "[solver]") {
  TestSetup wet = loam(0.15, 0.05);
  wet.initial_head = -0.1;
  CHECK(resolution_for(wet, 0.01, kLambda, 720.0).theta_tolerance <
        resolution_for(loam(0.15, 0.05), 0.01, kLambda, 720.0).theta_tolerance);
}

TEST_CASE("a scaled resolution and back is the same; coarser is its double", "[solver]") {
  Resolution r = resolution_for(loam(0.15, 0.05), 0.01, kLambda, 720.0);
  CHECK(r.scaled(0.5).scaled(2.0).growth_down == Approx(r.growth_down).epsilon(1e-12));
  CHECK(r.coarser().tip_cell == Approx(2 * r.tip_cell));
  CHECK(r.coarser().growth == Approx(r.growth * r.growth));
  r.splits = 2;
  CHECK(r.coarser().splits == 1);
  CHECK(r.coarser().tip_cell == r.tip_cell);
}

// Green & Ampt 1911: with S^2 = 2 Ks dtheta (H + lambda) the front stands at S sqrt(t) / dtheta
// while gravity is weak; by hand for Ks = 1e-6 m/s, dtheta = 0.2, H + lambda = 0.2 m, t = 100 s:
// S = 2.8284e-4, depth = 2.8284e-4 * 10 / 0.2 = 1.41421e-2 m, plus Ks t / dtheta = 5e-4 m.
TEST_CASE("the wetted depth is estimated from sorptivity and gravity", "[solver]") {
  TestSetup setup = loam(0.15, 0.05);
  setup.soil.Ks = 1e-6;
  // theta_s such that 0.2 is left to fill at the initial saturation
  const double Se = setup.soil.curves->saturation(setup.initial_head);
  setup.soil.theta_s = setup.soil.theta_r + 0.2 / (1.0 - Se);
  setup.pond_head = 0.1;
  CHECK(wetted_depth_estimate(setup, 0.1, 100.0) == Approx(0.0146421).epsilon(1e-5));
}

TEST_CASE("the ground of a longer test reaches farther, and below the wall", "[solver]") {
  TestSetup setup = loam(0.15, 0.2);
  const Domain four_hours = transient_domain(setup, kLambda);
  setup.duration *= 4;
  const Domain sixteen_hours = transient_domain(setup, kLambda);
  CHECK(sixteen_hours.radius > four_hours.radius);
  CHECK(sixteen_hours.depth > four_hours.depth);
  CHECK(four_hours.depth > setup.ring.insertion + kLambda);
  CHECK(steady_domain(setup.ring, 0.25).radius > steady_domain(setup.ring, 0.05).radius);
}
