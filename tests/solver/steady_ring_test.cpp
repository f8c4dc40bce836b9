#include "solver/steady_ring.hpp"

#include <catch2/catch.hpp>
#include <memory>

#include "solver/flow/curve_table.hpp"
#include "solver/ground_materials.hpp"
#include "solver/resolution.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

SteadyFlow flow_of(const models::SingleRing& ring, double head, const Domain* domain = nullptr) {
  const models::Soil soil = class_soil("loam");
  const auto table = std::make_shared<CurveTable>(soil.curves);
  const Resolution fine{.tip_cell = ring.insertion > 0 ? 0.01 : 0.0005, .top_cell = 0.005};
  const SteadyRing problem{soil, ring, head};
  return domain ? steady_flow(problem, fine, table, *domain) : steady_flow(problem, fine, table);
}

}  // namespace

TEST_CASE("under a ring on the surface a thicker wall lets less water out beside it", "[solver]") {
  const SteadyFlow thin = flow_of({0.05, 0.0, 0.001}, 0.05);
  const SteadyFlow thick = flow_of({0.05, 0.0, 0.02}, 0.05);
  CHECK(thick.ring_flow < thin.ring_flow);
  CHECK(thick.seepage_flow <= thin.seepage_flow);
  CHECK(thin.seepage_flow > 0.0);
}

TEST_CASE("steady flow: deeper walls and lower heads let less in", "[solver]") {
  const double flow = flow_of({0.15, 0.05}, 0.05).ring_flow;
  CHECK(flow_of({0.15, 0.10}, 0.05).ring_flow < flow);
  CHECK(flow_of({0.15, 0.05}, 0.02).ring_flow < flow);
  // more than gravity alone would draw, Ks times the area (capillarity and pressure add)
  const double Ks = class_soil("loam").Ks;
  CHECK(flow > Ks * 3.14159265 * 0.15 * 0.15);
}

TEST_CASE("the steady domain is large enough for a tenth of a per cent", "[solver]") {
  const models::SingleRing ring{0.15, 0.05};
  const SteadyFlow usual = flow_of(ring, 0.05);
  const double lambda = CurveTable(class_soil("loam").curves).capillary_length();
  Domain wide = steady_domain(ring, lambda);
  wide.radius *= 3, wide.depth *= 3;
  CHECK(usual.ring_flow == Approx(flow_of(ring, 0.05, &wide).ring_flow).epsilon(1e-3));
  CHECK(usual.balance_error < 1e-6);
}

// Water that stands on a fine layer and spreads under dry ground is where the steady equation is
// hardest. Meshes of two accuracies must find the same flow.
TEST_CASE("steady flow on layered ground", "[solver][steady]") {
  struct Ground {
    const char *above, *below;
    double top;
  };
  for (const Ground& g : {Ground{"clay", "sand", 0.3}, Ground{"sand", "clay", 0.55},
                          Ground{"sandy loam", "clay", 0.10}, Ground{"loam", "sand", 0.11},
                          Ground{"silt", "sand", 0.05}}) {
    TestSetup s;
    s.soil = class_soil(g.above);
    s.initial_head = -3.0;
    s.ring = {0.15, 0.10};
    s.pond_head = 0.10;
    s.duration = 7200.0;
    s.layers_below.push_back({g.top, class_soil(g.below), -3.0, ""});
    const auto materials = ground_materials(s);
    const auto flow = [&](double accuracy) {
      const Resolution r =
          resolution_for(s, accuracy, materials.front().table->capillary_length(), 360.0);
      return steady_flow(s, {s.pond_head}, r, materials).ring_flow;
    };
    const double coarse = flow(0.01), fine = flow(0.004);
    CAPTURE(g.above, g.below, coarse / fine - 1);
    CHECK(coarse == Approx(fine).epsilon(0.01));
  }
}
