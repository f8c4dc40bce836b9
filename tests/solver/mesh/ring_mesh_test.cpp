#include "solver/mesh/ring_mesh.hpp"

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>

#include "solver/mesh/axisymmetric.hpp"
#include "solver/mesh/grading.hpp"
#include "tests/solver/soils.hpp"

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

bool same_faces(const CellsAndFaces& one, const CellsAndFaces& other) {
  const auto same = [](const Face& a, const Face& b) {
    return a.a == b.a && a.b == b.b && a.transmissibility == b.transmissibility &&
           a.rise == b.rise && a.part_a == b.part_a;
  };
  const auto same_outer = [](const BoundaryFace& a, const BoundaryFace& b) {
    return a.cell == b.cell && a.patch == b.patch && a.transmissibility == b.transmissibility &&
           a.rise == b.rise && a.area == b.area && a.position == b.position;
  };
  return std::equal(one.faces.begin(), one.faces.end(), other.faces.begin(), other.faces.end(),
                    same) &&
         std::equal(one.boundary.begin(), one.boundary.end(), other.boundary.begin(),
                    other.boundary.end(), same_outer);
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

// The recipe of the simplest ring, written out: graded from the wall both ways, from the surface
// and from the foot.
TEST_CASE("the simplest test's mesh is that of its own recipe, bit for bit", "[solver]") {
  const Resolution r{.tip_cell = 0.013, .top_cell = 0.004, .splits = 0};
  TestSetup s;
  s.soil = gardner_soil(5.0);
  for (double d : {0.05, 0.0}) {
    s.ring = {0.15, d, 0.004};
    const double tip = d > 0.0 ? r.tip_cell : 0.002;
    Resolution own = r;
    own.tip_cell = tip;
    std::vector<double> radii = graded_one_end(0.15, 0.0, tip, r.growth), z;
    std::reverse(radii.begin(), radii.end());
    std::vector<Wall> walls{{0.15, d, true}};
    std::vector<std::string> names{"ring", "outside"};
    const auto append = [](std::vector<double>& to, const std::vector<double>& more) {
      to.insert(to.end(), more.begin() + 1, more.end());
    };
    if (d <= 0.0) {
      append(radii, graded_both_ends(0.15, 0.15 + 0.004, tip, tip, r.growth));
      walls.push_back({0.15 + 0.004, 0.0, false});
      names = {"ring", "wall", "outside"};
    }
    append(radii, graded_one_end(radii.back(), kGround.radius, tip, r.growth));
    if (d > 0.0) z = graded_both_ends(0.0, -d, r.top_cell, tip, r.growth_inside);
    const std::vector<double> below = graded_one_end(-d, -kGround.depth, tip, r.growth_down);
    if (z.empty())
      z = below;
    else
      append(z, below);
    const CellsAndFaces by_hand = axisymmetric_mesh(radii, z, walls, names);
    const CellsAndFaces mesh = ring_mesh(s, kGround, own);
    CAPTURE(d);
    CHECK(mesh.volume == by_hand.volume);
    CHECK(mesh.elevation == by_hand.elevation);
    CHECK(mesh.soil == by_hand.soil);
    CHECK(mesh.patches == by_hand.patches);
    CHECK(same_faces(mesh, by_hand));
    CHECK(same_faces(ring_mesh(s.ring, kGround, own), by_hand));
  }
}

TEST_CASE("double ring: areas of the patches, square cells at both feet", "[solver]") {
  TestSetup s;
  s.soil = gardner_soil(5.0);
  s.ring = {0.15, 0.05};
  s.outer_ring = models::SingleRing{0.30, 0.12};
  const CellsAndFaces mesh = ring_mesh(s, kGround, kResolution);
  constexpr double pi = std::numbers::pi;
  CHECK(mesh.patches == std::vector<std::string>{"ring", "annulus", "outside", "bottom", "side"});
  CHECK(surface(mesh, "ring") == Approx(pi * 0.0225).epsilon(1e-12));
  CHECK(surface(mesh, "annulus") == Approx(pi * (0.09 - 0.0225)).epsilon(1e-12));
  CHECK(surface(mesh, "outside") == Approx(pi * (0.64 - 0.09)).epsilon(1e-12));
  int at_feet = 0;
  for (std::size_t c = 0; c < mesh.volume.size(); ++c)
    for (const models::SingleRing& ring : {s.ring, *s.outer_ring})
      for (int corner : mesh.drawing.cells[c]) {
        const auto& p = mesh.drawing.points[static_cast<std::size_t>(corner)];
        if (std::hypot(p[0] - ring.radius, p[1] + ring.insertion) > 1e-9) continue;
        ++at_feet;
        CHECK(width(mesh, c, 0) == Approx(0.005).epsilon(1e-9));
        CHECK(width(mesh, c, 1) == Approx(0.005).epsilon(1e-9));
      }
  CHECK(at_feet == 8);
}

TEST_CASE("double ring: no face leads through either wall, all others are there", "[solver]") {
  TestSetup s;
  s.soil = gardner_soil(5.0);
  s.ring = {0.15, 0.05};
  s.outer_ring = models::SingleRing{0.30, 0.12};
  const CellsAndFaces mesh = ring_mesh(s, kGround, kResolution);
  int through = 0, below = 0;
  for (const Face& f : mesh.faces) {
    const auto& a = mesh.drawing.centres[static_cast<std::size_t>(f.a)];
    const auto& b = mesh.drawing.centres[static_cast<std::size_t>(f.b)];
    for (const models::SingleRing& ring : {s.ring, *s.outer_ring})
      if (a[0] < ring.radius && b[0] > ring.radius) (-a[1] < ring.insertion ? through : below) += 1;
  }
  CHECK(through == 0);
  int rows_below = 0;  // of each wall, counted in the first column
  const double r = mesh.drawing.centres[0][0];
  for (const auto& centre : mesh.drawing.centres)
    if (centre[0] == r) rows_below += (-centre[1] > 0.05) + (-centre[1] > 0.12);
  CHECK(below == rows_below);
}

TEST_CASE("double ring: an inner ring that divides nothing has its area and no strip", "[solver]") {
  TestSetup s;
  s.soil = gardner_soil(5.0);
  s.ring = {0.15, 0.0};
  s.outer_ring = models::SingleRing{0.30, 0.05};
  s.pond_head = 0.05;
  const CellsAndFaces mesh = ring_mesh(s, kGround, kResolution);
  CHECK(surface(mesh, "ring") == Approx(std::numbers::pi * 0.0225).epsilon(1e-12));
  CHECK(std::count(mesh.patches.begin(), mesh.patches.end(), "wall") == 0);
  // as if only the outer ring stood there, but for one more line
  TestSetup outer = s;
  outer.ring = *s.outer_ring;
  outer.outer_ring.reset();
  CHECK(mesh.cells() <= 1.2 * ring_mesh(outer, kGround, kResolution).cells());
}

TEST_CASE("anisotropic soil: the cells at the foot are square in stretched coordinates",
          "[solver]") {
  TestSetup s;
  s.soil = gardner_soil(5.0);
  s.soil.anisotropy = 4.0;
  s.ring = {0.15, 0.05};
  const CellsAndFaces mesh = ring_mesh(s, kGround, kResolution);
  int at_foot = 0;
  for (std::size_t c = 0; c < mesh.volume.size(); ++c)
    for (int corner : mesh.drawing.cells[c]) {
      const auto& p = mesh.drawing.points[static_cast<std::size_t>(corner)];
      if (std::hypot(p[0] - 0.15, p[1] + 0.05) > 1e-9) continue;
      ++at_foot;
      CHECK(width(mesh, c, 0) == Approx(0.010).epsilon(1e-9));
      CHECK(width(mesh, c, 1) == Approx(0.005).epsilon(1e-9));
    }
  CHECK(at_foot == 4);
}

TEST_CASE("gap: the cells about its end are squares of its width", "[solver]") {
  TestSetup s;
  s.soil = gardner_soil(5.0);
  s.ring = {0.15, 0.05};
  s.gap = models::WallGap{0.001};
  Resolution whole = kResolution;
  whole.splits = 0;
  const CellsAndFaces mesh = ring_mesh(s, kGround, whole);
  int at_foot = 0;
  for (std::size_t c = 0; c < mesh.volume.size(); ++c)
    for (int corner : mesh.drawing.cells[c]) {
      const auto& p = mesh.drawing.points[static_cast<std::size_t>(corner)];
      if (std::hypot(p[0] - 0.15, p[1] + 0.05) > 1e-9) continue;
      ++at_foot;
      CHECK(width(mesh, c, 0) == Approx(0.001).epsilon(1e-9));
      CHECK(width(mesh, c, 1) == Approx(0.001).epsilon(1e-9));
    }
  CHECK(at_foot == 4);
}

TEST_CASE("a water table and the tops of layers are lines of the mesh, with small cells at them",
          "[solver]") {
  TestSetup s;
  s.soil = gardner_soil(10.0);  // capillary length 10 cm
  s.ring = {0.15, 0.05};
  s.water_table = 0.9;
  models::Layer below;
  below.top = 0.4, below.soil = gardner_soil(5.0);
  s.layers_below = {below};
  const CellsAndFaces mesh = ring_mesh(s, kGround, kResolution);
  const auto height_at = [&](double depth) {  // of the tallest cell with an edge there
    double tallest = 0.0;
    for (std::size_t c = 0; c < mesh.volume.size(); ++c)
      for (int corner : mesh.drawing.cells[c])
        if (std::abs(mesh.drawing.points[static_cast<std::size_t>(corner)][1] + depth) < 1e-9)
          tallest = std::max(tallest, width(mesh, c, 1));
    return tallest;
  };
  CHECK(height_at(0.9) > 0.0);
  CHECK(height_at(0.9) <= 0.2 / 4);
  CHECK(height_at(0.4) > 0.0);
  CHECK(height_at(0.4) <= 0.1 / 2);
  CHECK(height_at(0.55) == 0.0);
}
