#include "solver/flow/steady_newton.hpp"

#include <catch2/catch.hpp>
#include <cmath>

#include "solver/mesh/axisymmetric.hpp"
#include "tests/solver/flow_run.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

SteadyResult solve_column(FlowSystem& flow, double first_head) {
  std::vector<double> Phi(static_cast<std::size_t>(flow.cells()),
                          flow.table(0).potential_of_head(first_head));
  return solve_steady(flow, Phi);
}

}  // namespace

// A column ponded at the surface over a freely draining bottom ends saturated, or nearly so:
// Darcy's law with the gradient (H + L)/L where the bottom is held at 0.
TEST_CASE("steady flow: ponded column over a bottom at zero head", "[solver][flow]") {
  for (const char* texture : {"sand", "loam", "clay"}) {
    const models::Soil soil = class_soil(texture);
    FlowSystem flow(
        column_mesh(equal_edges(0.0, -1.0, 20)), soil, std::make_shared<CurveTable>(soil.curves),
        {Condition::constant(Boundary::head, 0.25), Condition::constant(Boundary::head, 0.0)});
    CAPTURE(texture);
    REQUIRE(solve_column(flow, -1.0).converged);
    CHECK(-flow.patch_outflow()[0] == Approx(1.25 * soil.Ks).epsilon(1e-6));
    CHECK(flow.patch_outflow()[1] == Approx(1.25 * soil.Ks).epsilon(1e-6));
  }
}

// Under a steady rain q < Ks the column above free drainage takes the head with K(h) = q.
TEST_CASE("steady flow: rain over free drainage", "[solver][flow]") {
  for (const char* texture : {"sand", "loam", "silt"}) {
    const models::Soil soil = class_soil(texture);
    const double h = -0.5, q = soil.conductivity(h);
    FlowSystem flow(column_mesh(equal_edges(0.0, -1.0, 20)), soil,
                    std::make_shared<CurveTable>(soil.curves),
                    {Condition::constant(Boundary::flux, q), {Boundary::free_drainage, {}, false}});
    for (double first : {-2.0, -0.1}) {
      CAPTURE(texture, first);
      const SteadyResult found = solve_column(flow, first);
      REQUIRE(found.converged);
      CHECK(found.largest_defect < 1e-6);
      for (int i = 0; i < flow.cells(); ++i)
        CHECK(flow.point(i).K * soil.Ks == Approx(q).epsilon(1e-5));
    }
  }
}
