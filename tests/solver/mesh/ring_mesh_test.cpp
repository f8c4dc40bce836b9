#include "solver/mesh/ring_mesh.hpp"

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>

using namespace ringwright;
using namespace ringwright::solver;

namespace {

const Domain kGround{0.8, 1.2};
const Resolution kResolution{.tip_cell = 0.01, .top_cell = 0.005};

double surface(const CellsAndFaces& mesh, const std::string& name) {
  double area = 0.0;
  for (const BoundaryFace& f : mesh.boundary)
    if (mesh.patches[static_cast<std::size_t>(f.patch)] == name) area += f.area;
  return area;
}

double width(const CellsAndFaces& mesh, std::size_t cell, int axis) {
  double low = 1e30, high = -1e30;
  for (int corner : mesh.drawing.cells[cell]) {
    const double x =
        mesh.drawing.points[static_cast<std::size_t>(corner)][static_cast<std::size_t>(axis)];
    low = std::min(low, x);
    high = std::max(high, x);
  }
  return high - low;
}

}  // namespace

TEST_CASE("the ring's surface is the circle of its radius, the ground a cylinder", "[solver]") {
  const models::SingleRing ring{0.15, 0.05};
  const CellsAndFaces mesh = ring_mesh(ring, kGround, kResolution);
  double volume = 0.0;
  for (double v : mesh.volume) volume += v;
  CHECK(surface(mesh, "ring") == Approx(std::numbers::pi * 0.15 * 0.15).epsilon(1e-12));
  CHECK(volume == Approx(std::numbers::pi * 0.8 * 0.8 * 1.2).epsilon(1e-12));
}

TEST_CASE("the four cells at the foot of the wall are squares of the size asked for", "[solver]") {
  const models::SingleRing ring{0.15, 0.05};
  const CellsAndFaces mesh = ring_mesh(ring, kGround, kResolution.scaled(1.0));
  // splits = 1 by default: half the size asked for
  int at_foot = 0;
  for (std::size_t c = 0; c < mesh.volume.size(); ++c) {
    bool touches = false;
    for (int corner : mesh.drawing.cells[c]) {
      const auto& p = mesh.drawing.points[static_cast<std::size_t>(corner)];
      touches = touches || (std::abs(p[0] - 0.15) < 1e-9 && std::abs(p[1] + 0.05) < 1e-9);
    }
    if (!touches) continue;
    ++at_foot;
    CHECK(width(mesh, c, 0) == Approx(0.005).epsilon(1e-9));
    CHECK(width(mesh, c, 1) == Approx(0.005).epsilon(1e-9));
  }
  CHECK(at_foot == 4);
}

TEST_CASE("a ring on the surface covers a closed strip of its wall's thickness", "[solver]") {
  const models::SingleRing ring{0.15, 0.0, 0.004};
  Resolution fine = kResolution;
  fine.tip_cell = 0.002;
  const CellsAndFaces mesh = ring_mesh(ring, kGround, fine);
  CHECK(surface(mesh, "wall") ==
        Approx(std::numbers::pi * (0.154 * 0.154 - 0.15 * 0.15)).epsilon(1e-9));
  CHECK_THROWS_AS(ring_mesh({0.15, 0.0, 0.0}, kGround, fine), std::invalid_argument);
  const CellsAndFaces driven = ring_mesh({0.15, 0.05, 0.004}, kGround, fine);
  CHECK(std::count(driven.patches.begin(), driven.patches.end(), "wall") == 0);
}

TEST_CASE("one more split makes four cells of one", "[solver]") {
  Resolution once = kResolution, twice = kResolution;
  once.splits = 1, twice.splits = 2;
  const models::SingleRing ring{0.15, 0.05};
  CHECK(ring_mesh(ring, kGround, twice).cells() == 4 * ring_mesh(ring, kGround, once).cells());
}
