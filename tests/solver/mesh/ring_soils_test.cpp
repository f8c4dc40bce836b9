#include "solver/mesh/ring_soils.hpp"

#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>

#include "solver/ground_materials.hpp"
#include "solver/mesh/ring_mesh.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

constexpr double pi = std::numbers::pi;

models::Layer layer(double top, double alpha) {
  models::Layer l;
  l.top = top, l.soil = gardner_soil(alpha), l.initial_head = -2.0;
  return l;
}

TestSetup layered() {
  TestSetup s;
  s.soil = gardner_soil(5.0);
  s.initial_head = -3.0;
  s.ring = {0.15, 0.06};
  s.pond_head = 0.05;
  s.layers_below = {layer(0.03, 10.0), layer(0.20, 3.0)};
  return s;
}

// Volume of the ground by soil index, from the mesh.
double volume_of(const CellsAndFaces& mesh, int soil) {
  double sum = 0.0;
  for (std::size_t c = 0; c < mesh.volume.size(); ++c)
    if (mesh.soil[c] == soil) sum += mesh.volume[c];
  return sum;
}

double shell(double from, double to, double height) {
  return pi * (to * to - from * from) * height;
}

const Domain kGround{0.9, 1.1};
const Resolution kResolution{.tip_cell = 0.01, .top_cell = 0.004, .splits = 0};

}  // namespace

TEST_CASE("layers: every soil fills its own cylinder", "[solver][mesh]") {
  const TestSetup s = layered();
  const CellsAndFaces mesh = ring_mesh(s, kGround, kResolution);
  CHECK(volume_of(mesh, 0) == Approx(shell(0, 0.9, 0.03)).epsilon(1e-12));
  CHECK(volume_of(mesh, 1) == Approx(shell(0, 0.9, 0.17)).epsilon(1e-12));
  CHECK(volume_of(mesh, 2) == Approx(shell(0, 0.9, 0.90)).epsilon(1e-12));
}

TEST_CASE("disturbed soil: a shell on both sides of the wall down to its foot", "[solver][mesh]") {
  TestSetup s = layered();
  s.disturbed = models::DisturbedSoil{0.02, 3.0};
  const CellsAndFaces mesh = ring_mesh(s, kGround, kResolution);
  CHECK(volume_of(mesh, disturbed_index(s, 0)) == Approx(shell(0.13, 0.17, 0.03)).epsilon(1e-12));
  CHECK(volume_of(mesh, disturbed_index(s, 1)) == Approx(shell(0.13, 0.17, 0.03)).epsilon(1e-12));
  CHECK(volume_of(mesh, disturbed_index(s, 2)) == 0.0);
}

TEST_CASE("gap: one column on both sides of every wall, around its foot; disturbed soil beyond it",
          "[solver][mesh]") {
  TestSetup s = layered();
  s.gap = models::WallGap{0.002};
  s.disturbed = models::DisturbedSoil{0.01, 3.0};
  s.outer_ring = models::SingleRing{0.30, 0.10};
  const CellsAndFaces mesh = ring_mesh(s, kGround, kResolution);
  CHECK(volume_of(mesh, gap_index(s)) ==
        Approx(shell(0.148, 0.152, 0.062) + shell(0.298, 0.302, 0.102)).epsilon(1e-12));
  CHECK(volume_of(mesh, disturbed_index(s, 0)) ==
        Approx(shell(0.138, 0.148, 0.03) + shell(0.152, 0.162, 0.03) + shell(0.288, 0.298, 0.03) +
               shell(0.302, 0.312, 0.03))
            .epsilon(1e-12));
  int columns = 0;  // of gap in the uppermost row
  for (std::size_t c = 0; c < mesh.soil.size(); ++c)
    columns += mesh.soil[c] == gap_index(s) && mesh.elevation[c] == mesh.elevation[0];
  CHECK(columns == 4);
  int around = 0;  // faces that join gap with gap below a foot
  for (const Face& f : mesh.faces) {
    const auto a = static_cast<std::size_t>(f.a), b = static_cast<std::size_t>(f.b);
    around += f.horizontal && mesh.soil[a] == gap_index(s) && mesh.soil[b] == gap_index(s);
  }
  CHECK(around == 2);
}

TEST_CASE("a shell wider than the ring fills the ring", "[solver][mesh]") {
  TestSetup s = layered();
  s.ring.radius = 0.05;
  s.disturbed = models::DisturbedSoil{0.08, 0.5};
  CHECK(volume_of(ring_mesh(s, kGround, kResolution), disturbed_index(s, 0)) ==
        Approx(shell(0, 0.13, 0.03)).epsilon(1e-12));
}

TEST_CASE("a layer's top belongs to the layer", "[solver][mesh]") {
  const TestSetup s = layered();
  CHECK(layer_at(s, 0.0) == 0);
  CHECK(layer_at(s, 0.03) == 1);
  CHECK(layer_at(s, 0.19) == 1);
  CHECK(soil_at(s, 0.5, 0.5) == layer_index(s, 2));
}
