/// Horizontal conductivity k times the vertical: in r / sqrt(k) the flow equation is the isotropic
/// one, so that a ring sqrt(k) times as wide takes k times the water (coordinate stretching,
/// Maasland 1957, Drainage of Agricultural Lands, ASA Monogr. 7:216; from memory).

#include <catch2/catch.hpp>
#include <cmath>

#include "solver/resolution.hpp"
#include "solver/steady_ring.hpp"
#include "tests/solver/soils.hpp"
#include "validation/layers/ring_flow.hpp"

using namespace ringwright;
using namespace ringwright::solver;
using ringwright::validation::saturated_ring_flow;

namespace {

struct Pair {
  TestSetup plain, wide;
  Domain ground{4.0, 5.0}, wide_ground;
  Resolution resolution;

  Pair(double alpha, double insertion, double k) {
    const double stretch = std::sqrt(k);
    plain.soil = gardner_soil(alpha);
    plain.initial_head = -10.0 / alpha;
    plain.ring = {0.15, insertion, 0.003};
    plain.pond_head = 0.05;
    wide = plain;
    wide.soil.anisotropy = k;
    wide.ring.radius *= stretch;
    wide.ring.wall *= stretch;
    wide_ground = {ground.radius * stretch, ground.depth};
    resolution = resolution_for(plain, 0.01, 1 / alpha, 600.0);
    CHECK(resolution_for(wide, 0.01, 1 / alpha, 600.0).tip_cell ==
          Approx(resolution.tip_cell).epsilon(1e-12));
    // a strip of exactly two cells is cut into two or three of them as rounding has it
    resolution = resolution.scaled(0.9);
  }
};

}  // namespace

TEST_CASE("anisotropy by stretching: saturated ground without gravity", "[layers][steady]") {
  for (double d : {0.0, 0.05})
    for (double k : {0.1, 4.0, 25.0}) {
      const Pair p(5.0, d, k);
      const double plain =
          saturated_ring_flow(p.plain, ground_materials(p.plain), p.ground, p.resolution);
      const double wide =
          saturated_ring_flow(p.wide, ground_materials(p.wide), p.wide_ground, p.resolution);
      CAPTURE(d, k, plain, wide);
      CHECK(wide / plain == Approx(k).epsilon(1e-9));
    }
}

TEST_CASE("anisotropy by stretching: Gardner's soil with gravity", "[layers][steady]") {
  for (double d : {0.0, 0.05})
    for (double alpha : {3.0, 15.0})
      for (double k : {0.1, 4.0, 25.0}) {
        const Pair p(alpha, d, k);
        const SteadyFlow plain =
            steady_flow(p.plain, {.ring = 0.05}, p.resolution, ground_materials(p.plain), p.ground);
        const SteadyFlow wide = steady_flow(p.wide, {.ring = 0.05}, p.resolution,
                                            ground_materials(p.wide), p.wide_ground);
        CAPTURE(d, alpha, k, plain.ring_flow, wide.ring_flow);
        CHECK(wide.ring_flow / plain.ring_flow == Approx(k).epsilon(1e-6));
        CHECK(wide.seepage_flow == Approx(k * plain.seepage_flow).margin(1e-6 * wide.ring_flow));
      }
}
