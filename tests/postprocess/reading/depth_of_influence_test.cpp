#include "postprocess/reading/depth_of_influence.hpp"

#include <catch2/catch.hpp>
#include <cmath>

#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "tests/postprocess/reading/staged_question.hpp"

using namespace ringwright;
using namespace ringwright::postprocess;

namespace {

struct Found {
  solver::TestSetup setup;
  std::shared_ptr<const solver::CurveTable> table;
  DepthOfInfluence at;

  Found(solver::TestSetup s, double stop)
      : setup(std::move(s)), table(std::make_shared<solver::CurveTable>(setup.soil.curves)) {
    setup.duration = stop;
    at = depth_of_influence(setup, stop, 0.3, table);
  }
  /// On a mesh several times finer than the search's.
  double change(double depth) const {
    const auto fine =
        solver::resolution_for(setup, 0.004, table->capillary_length(), 0.05 * setup.duration);
    return influence_of(setup, depth, fine, table);
  }
};

}  // namespace

TEST_CASE("the influence is that of ground made by hand", "[reading]") {
  solver::TestSetup as_is = ring_question("sandy loam").setup;
  as_is.times = {as_is.duration};
  models::Layer middle{0.07, as_is.soil, -3.0, "same"}, deep{0.12, as_is.soil, -2.0, "half"};
  deep.soil.Ks *= 0.5;
  as_is.layers_below = {deep};
  const auto table = std::make_shared<solver::CurveTable>(as_is.soil.curves);
  const auto r = solver::resolution_for(as_is, 0.02, table->capillary_length(), 360.0);
  const double change = influence_of(as_is, 0.07, r, table);
  // twice below 7 cm: of the uppermost soil down to 12 cm, of the layer from there on
  const auto flow = [&](double factor) {
    solver::TestSetup made = as_is;
    made.layers_below = {middle, deep};
    for (models::Layer& layer : made.layers_below) layer.soil.Ks *= factor;
    return solver::run_test(made, r, table).samples.back().ring_flow;
  };
  CHECK(change == Approx(flow(2.0) / flow(1.0) - 1.0).epsilon(1e-6));
  CHECK(change > 0.01);
}

TEST_CASE("below the depth of influence doubling K moves the rate by less than 5 %, above by more",
          "[reading]") {
  for (const char* texture : {"sandy loam", "silt"}) {
    CAPTURE(texture);
    const Found f(ring_question(texture).setup, 3600.0);
    REQUIRE(f.at.known);
    CHECK(f.change(1.15 * f.at.depth) < 0.05);
    CHECK(f.change(f.at.depth / 1.15) > 0.05);
  }
}

TEST_CASE("the depth of influence grows with the time of the stop and with the ring", "[reading]") {
  solver::TestSetup setup = ring_question("loam").setup;
  const double early = Found(setup, 900.0).at.depth, late = Found(setup, 14400.0).at.depth;
  CHECK(late > 1.05 * early);
  setup.ring.radius *= 3;
  CHECK(Found(setup, 14400.0).at.depth > 1.05 * late);
}

TEST_CASE("layered ground has a depth of influence too", "[reading]") {
  solver::TestSetup setup = ring_question("sandy loam").setup;
  models::Layer band{0.08, setup.soil, -3.0, "band"};
  band.soil.Ks *= 0.2;
  setup.layers_below = {band};
  const Found f(setup, 3600.0);
  REQUIRE(f.at.known);
  CHECK(f.change(1.15 * f.at.depth) < 0.05);
  CHECK(f.change(f.at.depth / 1.15) > 0.05);
}

TEST_CASE("a stopped search knows nothing", "[reading]") {
  const solver::TestSetup setup = ring_question("loam").setup;
  const auto table = std::make_shared<solver::CurveTable>(setup.soil.curves);
  CHECK_FALSE(depth_of_influence(setup, 3600.0, 0.3, table, [] { return false; }).known);
}
