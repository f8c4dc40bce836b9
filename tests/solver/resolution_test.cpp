#include "solver/resolution.hpp"

#include <catch2/catch.hpp>
#include <cmath>

#include "models/soil/capillary_length.hpp"
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

namespace {

models::Layer layer_of(const std::string& texture, double top) {
  models::Layer layer;
  layer.top = top;
  layer.soil = models::make_soil(models::published_soils_of(texture).front());
  layer.initial_head = -3.0;
  return layer;
}

}  // namespace

TEST_CASE("the outer ring asks for cells of its own", "[solver]") {
  TestSetup setup = loam(0.15, 0.10);
  const double alone = resolution_for(setup, 0.01, kLambda, 720.0).tip_cell;
  setup.outer_ring = models::SingleRing{0.30, 0.10};
  CHECK(resolution_for(setup, 0.01, kLambda, 720.0).tip_cell < alone);
  setup.outer_ring->insertion = 0.01;
  CHECK(resolution_for(setup, 0.01, kLambda, 720.0).tip_cell <= 0.005);
  setup.outer_ring = models::SingleRing{0.17, 0.10};
  CHECK(resolution_for(setup, 0.01, kLambda, 720.0).tip_cell < 0.0051);  // a quarter of 2 cm
}

TEST_CASE("an inner ring that divides nothing asks for nothing", "[solver]") {
  TestSetup setup = loam(0.15, 0.0);
  setup.outer_ring = models::SingleRing{0.30, 0.10};
  CHECK(resolution_for(setup, 0.01, kLambda, 720.0).tip_cell ==
        resolution_for(loam(0.30, 0.10), 0.01, kLambda, 720.0).tip_cell);
  setup.outer_program.stages = {models::Stage{.head = 0.2, .duration = 3600.0}};
  CHECK(resolution_for(setup, 0.01, kLambda, 720.0).tip_cell <= setup.ring.wall / 2);
}

TEST_CASE("what lies close to a foot is resolved", "[solver]") {
  const double plain = resolution_for(loam(0.15, 0.05), 0.01, kLambda, 720.0).tip_cell;
  TestSetup setup = loam(0.15, 0.05);
  SECTION("a layer just below it") {
    setup.layers_below = {layer_of("sand", 0.055)};
    CHECK(resolution_for(setup, 0.01, kLambda, 720.0).tip_cell <= 0.0025);
  }
  SECTION("disturbed soil") {
    setup.disturbed = models::DisturbedSoil{0.006, 3.0};
    CHECK(resolution_for(setup, 0.01, kLambda, 720.0).tip_cell <= 0.003);
  }
  SECTION("a layer whose top is at the foot needs nothing more") {
    setup.layers_below = {layer_of("loam", 0.05)};
    CHECK(resolution_for(setup, 0.01, kLambda, 720.0).tip_cell == plain);
  }
}

TEST_CASE("a coarse layer near the foot asks for cells fit for its capillary length", "[solver]") {
  TestSetup setup = loam(0.5, 0.2);
  setup.layers_below = {layer_of("sand", 0.4)};
  const double lambda = models::capillary_length(*setup.layers_below[0].soil.curves);
  REQUIRE(lambda < kLambda);
  CHECK(resolution_for(setup, 0.05, kLambda, 720.0).tip_cell <= lambda / 2);
  setup.layers_below[0].top = 10.0;
  CHECK(resolution_for(setup, 0.05, kLambda, 720.0).tip_cell ==
        resolution_for(loam(0.5, 0.2), 0.05, kLambda, 720.0).tip_cell);
}

// An anisotropic problem is the isotropic one in r / sqrt(Kr / Kz).
TEST_CASE("anisotropic soil: the resolution of the stretched ring", "[solver]") {
  TestSetup setup = loam(0.20, 0.05);
  setup.soil.anisotropy = 4.0;
  CHECK(resolution_for(setup, 0.01, kLambda, 720.0).tip_cell ==
        Approx(resolution_for(loam(0.10, 0.05), 0.01, kLambda, 720.0).tip_cell).epsilon(1e-12));
}

TEST_CASE("the ground fits the larger ring, the deeper foot, the larger head", "[solver]") {
  TestSetup setup = loam(0.15, 0.05);
  const Domain single = transient_domain(setup, kLambda);
  setup.outer_ring = models::SingleRing{0.30, 0.15};
  const Domain larger = transient_domain(setup, kLambda);
  CHECK(larger.radius == Approx(single.radius + 0.15));
  CHECK(larger.depth == Approx(single.depth + 0.10));
  setup.outer_program.stages = {models::Stage{.head = 0.2, .duration = 3600.0}};
  CHECK(largest_head(setup) == 0.2);
  CHECK(transient_domain(setup, kLambda).radius > larger.radius);
}

TEST_CASE("layers widen the ground only if they can be reached", "[solver]") {
  TestSetup setup = loam(0.15, 0.05);
  const Domain uniform = transient_domain(setup, kLambda);
  setup.layers_below = {layer_of("sand", 0.5)};
  CHECK(transient_domain(setup, kLambda).depth > uniform.depth);
  setup.layers_below = {layer_of("sand", uniform.depth + 0.1)};
  CHECK(transient_domain(setup, kLambda).depth == uniform.depth);
  setup.layers_below.clear();
  setup.soil.anisotropy = 4.0;
  CHECK(transient_domain(setup, kLambda).radius - 0.15 ==
        Approx(2 * (uniform.radius - 0.15)).epsilon(1e-12));
}

TEST_CASE("with a water table the ground reaches well below it", "[solver]") {
  TestSetup setup = loam(0.15, 0.05);
  setup.water_table = 1.0;
  const Domain domain = transient_domain(setup, kLambda);
  CHECK(domain.depth > 1.0 + 10 * 0.15);
  CHECK(steady_domain(setup, kLambda).depth == domain.depth);
  setup.water_table = 0.0;  // saturated to the surface: nothing left to fill, still finite
  CHECK(std::isfinite(transient_domain(setup, kLambda).radius));
}

TEST_CASE("the steady ground of the simplest test is that of its ring", "[solver]") {
  const TestSetup setup = loam(0.15, 0.05);
  CHECK(steady_domain(setup, kLambda).radius == steady_domain(setup.ring, kLambda).radius);
  CHECK(steady_domain(setup, kLambda).depth == steady_domain(setup.ring, kLambda).depth);
}
