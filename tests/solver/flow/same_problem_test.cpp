#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>

#include "solver/mesh/axisymmetric.hpp"
#include "solver/mesh/grading.hpp"
#include "tests/solver/flow_run.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

struct Body {
  CellsAndFaces mesh;
  double area;
  std::size_t columns;
};

std::vector<Condition> infiltration(const CellsAndFaces& mesh) {
  std::vector<Condition> c(mesh.patches.size());
  for (std::size_t i = 0; i < c.size(); ++i) {
    if (mesh.patches[i] == "top") c[i] = Condition::constant(Boundary::head, 0.05);
    if (mesh.patches[i] == "bottom") c[i].kind = Boundary::free_drainage;
  }
  return c;
}

}  // namespace

// One-dimensional infiltration, written on three kinds of mesh, is one problem.
TEST_CASE("the same infiltration on column, axisymmetric and plane mesh is equal to 1e-9",
          "[solver][flow]") {
  const std::vector<double> z = graded_one_end(0.0, -2.0, 0.004, 1.15);
  const std::vector<double> x{0.0, 0.05, 0.15, 0.3, 0.5};
  const std::vector<Body> bodies{{column_mesh(z, 2.5), 2.5, 1},
                                 {axisymmetric_mesh(x, z, {}, {"top"}), std::numbers::pi / 4, 4},
                                 {plane_mesh(x, z), 0.5, 4}};
  const std::vector<double> times{600.0, 3600.0, 14400.0};
  for (const char* texture : {"sand", "loam", "clay"}) {
    const models::Soil soil = class_soil(texture);
    const auto table = std::make_shared<CurveTable>(soil.curves);
    std::vector<FlowRun> runs;
    for (const Body& b : bodies) {
      FlowSystem flow(b.mesh, soil, table, infiltration(b.mesh));
      runs.push_back(run_flow(flow, 1e-3, uniform_state(flow, -3.0), times));
    }
    CAPTURE(texture);
    for (std::size_t k = 1; k < bodies.size(); ++k)
      for (std::size_t i = 0; i < times.size(); ++i) {
        const FlowRecord &a = runs[0].records[i], &b = runs[k].records[i];
        CAPTURE(k, times[i], bodies[k].mesh.patches);
        for (std::size_t p = 0; p < 2; ++p) {  // top and bottom come first
          CHECK(b.volumes[p] / bodies[k].area ==
                Approx(a.volumes[p] / 2.5).epsilon(1e-9).margin(1e-15));
          CHECK(b.flows[p] / bodies[k].area ==
                Approx(a.flows[p] / 2.5).epsilon(1e-9).margin(1e-18));
        }
        double worst = 0.0;
        for (std::size_t c = 0; c < b.u.size(); ++c)
          worst = std::max(worst, std::abs(b.u[c] - a.u[c / bodies[k].columns]));
        CHECK(worst < 1e-9);
      }
  }
}
