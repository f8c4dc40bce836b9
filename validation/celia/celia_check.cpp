/// Infiltration into dry sand between two suctions, Celia, Bouloutas & Zarba 1990, Water Resour.
/// Res. 26:1483: the case on which schemes written in h alone lose water.
///
/// Parameters from memory. The expected values were computed for this check by an independent
/// scheme; I(24 h) = 4.1151, 4.1135, 4.1130 cm on 500, 1000 and 2000 cells, so that 4.113 is good
/// to 0.0005 cm. Depths and fluxes are asked for to one unit of their last digit.

#include <catch2/catch.hpp>
#include <cmath>

#include "models/soil/van_genuchten.hpp"
#include "solver/mesh/axisymmetric.hpp"
#include "tests/solver/flow_run.hpp"
#include "validation/column_profile.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

constexpr double cm = 0.01, hour = 3600.0;

struct Row {
  double time, intake, depth_200, depth_500, flux;  // [h], [cm], [cm], [cm], [cm/s]
};

}  // namespace

TEST_CASE("dry sand between two suctions: intake, fronts, flux, no water lost", "[column]") {
  const models::Soil soil{std::make_shared<models::VanGenuchten>(3.35, 2.0), 0.102, 0.368,
                          0.00922 * cm, 0.0};
  CHECK(soil.water_content(-10.0) == Approx(0.109937).margin(1e-6));
  CHECK(soil.water_content(-0.75) == Approx(0.200366).margin(1e-6));
  CHECK(soil.conductivity(-0.75) / cm == Approx(2.8174e-5).epsilon(2e-5));

  const CellsAndFaces mesh = column_mesh(equal_edges(0.0, -1.0, 4000));
  FlowSystem flow(
      mesh, soil, std::make_shared<CurveTable>(soil.curves),
      {Condition::constant(Boundary::head, -0.75), Condition::constant(Boundary::head, -10.0)});
  const std::vector<Row> rows{{6, 1.740, 23.70, 25.44, 4.673e-5},
                              {12, 2.633, 35.25, 37.50, 3.763e-5},
                              {18, 3.402, 44.92, 47.50, 3.398e-5},
                              {24, 4.113, 53.67, 56.48, 3.202e-5}};
  std::vector<double> times;
  for (const Row& row : rows) times.push_back(row.time * hour);
  const std::vector<double> u = uniform_state(flow, -10.0);
  const double before = stored_water(flow, u);
  const FlowRun r = run_flow(flow, 1e-5, u, times);
  const auto head = [&](double x) { return flow.table(0).head_of_u(x); };
  for (std::size_t i = 0; i < rows.size(); ++i) {
    const FlowRecord& at = r.records[i];
    CAPTURE(rows[i].time);
    CHECK(-at.volumes[0] / cm == Approx(rows[i].intake).epsilon(0).margin(5e-4));
    CHECK(validation::depth_of(mesh, at.u, -2.0, head) / cm ==
          Approx(rows[i].depth_200).epsilon(0).margin(0.01));
    CHECK(validation::depth_of(mesh, at.u, -5.0, head) / cm ==
          Approx(rows[i].depth_500).epsilon(0).margin(0.01));
    CHECK(-at.flows[0] / cm == Approx(rows[i].flux).epsilon(0).margin(1e-8));
    const double gained = stored_water(flow, at.u) - before;
    CHECK(gained == Approx(-at.volumes[0] - at.volumes[1]).epsilon(1e-6));
  }
}
