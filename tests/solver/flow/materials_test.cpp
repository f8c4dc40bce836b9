/// Faces between materials, and ponds as unknowns.

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>
#include <random>

#include "solver/flow/flow_system.hpp"
#include "solver/mesh/axisymmetric.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

Material material_of(const models::Soil& soil) {
  return {soil, std::make_shared<CurveTable>(soil.curves)};
}

// A block of a coarse ring mesh with a second and a third soil in it.
CellsAndFaces layered_ring() {
  CellsAndFaces mesh =
      axisymmetric_mesh({0.0, 0.05, 0.08, 0.11, 0.2, 0.4}, {0.0, -0.02, -0.05, -0.1, -0.25, -0.5},
                        {{0.08, 0.05, true}}, {"ring", "outside"});
  for (std::size_t i = 0; i < mesh.volume.size(); ++i) {
    if (mesh.elevation[i] < -0.05) mesh.soil[i] = 1;
    if (mesh.elevation[i] < -0.25) mesh.soil[i] = 2;
  }
  return mesh;
}

std::vector<double> random_state(const FlowSystem& flow, std::mt19937& generator) {
  std::uniform_real_distribution<double> exponent(-2.0, 1.0), wet(0.0, 0.3);
  std::vector<double> u;
  for (int i = 0; i < flow.cells(); ++i) {
    const bool saturated = generator() % 4 == 0;
    u.push_back(
        flow.u_of_head(i, saturated ? wet(generator) : -std::pow(10.0, exponent(generator))));
  }
  for (int k = 0; k < flow.ponds(); ++k) u.push_back(generator() % 2 == 0 ? 0.07 : -0.12);
  return u;
}

// Largest difference of a column of the Jacobian to central differences, over its largest entry.
double worst_column(FlowSystem& flow, std::vector<double> u) {
  const std::size_t n = u.size();
  const SparsePattern& p = flow.pattern();
  flow.set_state(u);
  std::vector<double> values(p.rows.size(), 0.0), up(n), down(n);
  flow.add_jacobian(values);
  double worst = 0.0;
  for (std::size_t j = 0; j < n; ++j) {
    std::vector<double> column(n, 0.0);
    for (int k = p.column_starts[j]; k < p.column_starts[j + 1]; ++k)
      column[static_cast<std::size_t>(p.rows[static_cast<std::size_t>(k)])] +=
          values[static_cast<std::size_t>(k)];
    const double old = u[j];
    const double room = old - flow.bounds(static_cast<int>(j)).driest;
    const double e = 1e-5 * std::min(1.0, room);
    u[j] = old + e;
    flow.set_state(u);
    flow.net_outflow(up);
    u[j] = old - e;
    flow.set_state(u);
    flow.net_outflow(down);
    u[j] = old;
    double size = 1e-300, wrong = 0.0, largest = 0.0;
    for (std::size_t i = 0; i < n; ++i) {
      const double slope = (up[i] - down[i]) / (2 * e);
      size = std::max(size, std::abs(slope));
      wrong = std::max(wrong, std::abs(slope - column[i]));
      largest = std::max(largest, std::abs(up[i]));
    }
    worst = std::max(worst, (wrong - 1e-12 * largest / e) / size);
  }
  return worst;
}

}  // namespace

TEST_CASE("Jacobian across materials and under ponds against differences", "[solver][flow]") {
  const CellsAndFaces mesh = layered_ring();
  std::mt19937 generator(11);
  for (const char* below : {"sand", "clay"}) {
    const std::vector<Material> materials = {material_of(class_soil("loam")),
                                             material_of(class_soil(below)),
                                             material_of(class_soil("silt"))};
    std::vector<Condition> conditions(mesh.patches.size());
    conditions[0].kind = Boundary::pond;
    FlowSystem flow(mesh, materials, conditions, {{0, 0.02, 0.0, 0.05}});
    REQUIRE(flow.unknowns() == mesh.cells() + 1);
    flow.set_feed(0, {0.0701, 1e-5, 1e-9});
    for (int k = 0; k < 20; ++k) {
      CAPTURE(below, k);
      CHECK(worst_column(flow, random_state(flow, generator)) < 1e-4);
    }
  }
}

TEST_CASE("a line between two of the same soil changes nothing without gravity", "[solver][flow]") {
  CellsAndFaces one = without_gravity(layered_ring());
  std::fill(one.soil.begin(), one.soil.end(), 0);
  const CellsAndFaces cut = without_gravity(layered_ring());
  const Material loam = material_of(class_soil("loam"));
  const std::vector<Condition> closed(one.patches.size());
  FlowSystem whole(one, {loam}, closed), parts(cut, {loam, loam, loam}, closed);
  std::mt19937 generator(5);
  const std::vector<double> u = random_state(whole, generator);
  std::vector<double> a(u.size()), b(u.size());
  whole.set_state(u);
  whole.net_outflow(a);
  parts.set_state(u);
  parts.net_outflow(b);
  const double size = std::abs(*std::max_element(a.begin(), a.end()));
  for (std::size_t i = 0; i < a.size(); ++i) CHECK(std::abs(a[i] - b[i]) < 1e-10 * size);
}

TEST_CASE("water at rest stays at rest across materials", "[solver][flow]") {
  const CellsAndFaces mesh = layered_ring();
  const std::vector<Material> materials = {material_of(class_soil("sand")),
                                           material_of(class_soil("clay")),
                                           material_of(class_soil("loam"))};
  FlowSystem flow(mesh, materials, std::vector<Condition>(mesh.patches.size()));
  std::vector<double> u, out(static_cast<std::size_t>(flow.unknowns()));
  for (int i = 0; i < flow.cells(); ++i)
    u.push_back(flow.u_of_head(i, 0.6 - mesh.elevation[static_cast<std::size_t>(i)]));
  flow.set_state(u);
  flow.net_outflow(out);
  for (double q : out) CHECK(std::abs(q) < 1e-12 * materials[0].soil.Ks);
}

// Saturated flow down through two layers: K's in series (Darcy; textbook).
TEST_CASE("saturated layers lie in series", "[solver][flow]") {
  CellsAndFaces mesh = column_mesh({0.0, -0.1, -0.3});
  mesh.soil[1] = 1;
  models::Soil upper = class_soil("loam"), lower = class_soil("sand");
  upper.Ks = 1e-6, lower.Ks = 5e-6;
  FlowSystem flow(
      mesh, {material_of(upper), material_of(lower)},
      {Condition::constant(Boundary::head, 0.4), Condition::constant(Boundary::head, 0.2)});
  // total head falls from 0.4 to 0.2 - 0.3; resistances 0.1 / 1e-6 and 0.2 / 5e-6
  const double expected = 0.5 / (0.1 / 1e-6 + 0.2 / 5e-6);
  const double h0 = 0.4 - expected * 0.05 / 1e-6 + 0.05;  // centre of the upper layer
  const double h1 = 0.2 + expected * 0.1 / 5e-6 - 0.1;    // centre of the lower one
  flow.set_state(std::vector<double>{h0, h1});
  std::vector<double> out(2);
  flow.net_outflow(out);
  CHECK(flow.patch_outflow()[1] == Approx(expected).epsilon(1e-9));
  CHECK(std::abs(out[0]) < 1e-9 * expected);
  CHECK(std::abs(out[1]) < 1e-9 * expected);
}

// K of a sand falls off so fast that gravity alone, weighted by the capillary length, would have a
// wet cell draw water from the dry one above it; hydrostatics says it cannot (textbook).
TEST_CASE("a tall dry cell over a wet one gives no water", "[solver][flow]") {
  for (const char* texture : {"sand", "loam", "clay"})
    for (const char* below : {"sand", "loam", "clay"}) {
      CellsAndFaces mesh = column_mesh({0.0, -0.08, -0.16});
      mesh.soil[1] = 1;
      FlowSystem flow(mesh, {material_of(class_soil(texture)), material_of(class_soil(below))},
                      std::vector<Condition>(mesh.patches.size()));
      std::vector<double> out(2);
      const double driest = flow.bounds(0).driest;
      for (double head : {-0.005, -0.02, -0.05, -0.1, -0.2}) {
        const std::vector<double> u = {driest + 1e-12 * std::abs(driest), flow.u_of_head(1, head)};
        flow.set_state(u);
        flow.net_outflow(out);
        CAPTURE(texture, below, head);
        CHECK(out[0] <= 1e-9 * flow.material(0).soil.Ks);
      }
    }
}

TEST_CASE("horizontal flow takes the anisotropy, vertical flow does not", "[solver][flow]") {
  const CellsAndFaces mesh = without_gravity(plane_mesh({0.0, 0.1, 0.2}, {0.0, -0.1, -0.2}));
  models::Soil soil = class_soil("loam");
  const auto flows = [&](double anisotropy) {
    soil.anisotropy = anisotropy;
    FlowSystem flow(mesh, {material_of(soil)}, std::vector<Condition>(mesh.patches.size()));
    std::vector<double> out(4);
    flow.set_state(std::vector<double>{0.3, 0.1, 0.1, 0.1});  // only the first cell gives
    flow.net_outflow(out);
    return out;
  };
  const std::vector<double> one = flows(1.0), three = flows(3.0);
  CHECK(three[1] == Approx(3.0 * one[1]));  // beside
  CHECK(three[2] == Approx(one[2]));        // below
}

TEST_CASE("a pond keeps account of what comes and goes", "[solver][flow]") {
  const CellsAndFaces mesh = layered_ring();
  const Material loam = material_of(class_soil("loam"));
  std::vector<Condition> conditions(mesh.patches.size());
  conditions[0].kind = Boundary::pond;
  FlowSystem flow(mesh, {loam, loam, loam}, conditions, {{0, 0.02, 0.0, 0.05}});
  flow.set_feed(0, {0.08, 1e-5, 1e-9});
  std::vector<double> u(static_cast<std::size_t>(flow.cells()), flow.u_of_head(0, -1.0));
  u.push_back(0.05);
  std::vector<double> out(u.size());
  flow.set_state(u);
  flow.net_outflow(out);
  const int pond = flow.pond_unknown(0);
  CHECK(flow.storage(pond) == Approx(1.0));  // 5 cm over a scale of 5 cm
  CHECK(flow.totals()[static_cast<std::size_t>(flow.supply_total(0))] == 1e-5);
  CHECK(flow.totals()[static_cast<std::size_t>(flow.evaporation_total(0))] == 1e-9);
  CHECK(flow.patch_outflow()[0] < 0.0);
  CHECK(out[static_cast<std::size_t>(pond)] == Approx(1e-9 - 1e-5 - flow.patch_outflow()[0]));
  CHECK_THROWS_AS(flow.set_condition(1, {Boundary::pond, {}, false}, 0.0), std::invalid_argument);
  CHECK_THROWS_AS(FlowSystem(mesh, {loam, loam, loam}, conditions, {{0, 0.0}}),
                  std::invalid_argument);
}

TEST_CASE("every soil of the mesh must be among the materials", "[solver][flow]") {
  const CellsAndFaces mesh = layered_ring();
  CHECK_THROWS_AS(FlowSystem(mesh, {material_of(class_soil("loam"))},
                             std::vector<Condition>(mesh.patches.size())),
                  std::invalid_argument);
}
