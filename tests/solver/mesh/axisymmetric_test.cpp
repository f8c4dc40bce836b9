#include "solver/mesh/axisymmetric.hpp"

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>
#include <numeric>

#include "solver/mesh/grading.hpp"
#include "tests/solver/flow_run.hpp"

using namespace ringwright::solver;

namespace {

constexpr double pi = std::numbers::pi;

double sum(const std::vector<double>& v) { return std::accumulate(v.begin(), v.end(), 0.0); }

double area_of(const CellsAndFaces& m, const std::string& patch) {
  double area = 0.0;
  for (const BoundaryFace& b : m.boundary)
    if (m.patches[static_cast<std::size_t>(b.patch)] == patch) area += b.area;
  return area;
}

const Face* face_between(const CellsAndFaces& m, int a, int b) {
  for (const Face& f : m.faces)
    if (f.a == a && f.b == b) return &f;
  return nullptr;
}

struct Grid {
  std::vector<double> radii{0.0, 0.03, 0.07, 0.10, 0.13, 0.20, 0.40};
  std::vector<double> elevations{0.0, -0.02, -0.05, -0.08, -0.15, -0.40};
  int cell(int i, int j) const { return j * 6 + i; }
};

}  // namespace

TEST_CASE("axisymmetric mesh: volumes and areas of the full circle", "[solver][mesh]") {
  const Grid g;
  const CellsAndFaces m =
      axisymmetric_mesh(g.radii, g.elevations, {{0.10, 0.05, true}}, {"ring", "outside"});
  CHECK(m.cells() == 30);
  CHECK(sum(m.volume) == Approx(pi * 0.4 * 0.4 * 0.4).epsilon(1e-13));
  CHECK(area_of(m, "ring") == Approx(pi * 0.1 * 0.1).epsilon(1e-13));
  CHECK(area_of(m, "outside") == Approx(pi * (0.4 * 0.4 - 0.1 * 0.1)).epsilon(1e-13));
  CHECK(area_of(m, "bottom") == Approx(pi * 0.4 * 0.4).epsilon(1e-13));
  CHECK(area_of(m, "side") == Approx(2 * pi * 0.4 * 0.4).epsilon(1e-13));
  CHECK(m.patches == std::vector<std::string>{"ring", "outside", "bottom", "side"});
}

TEST_CASE("axisymmetric mesh: the wall is the absence of faces", "[solver][mesh]") {
  const Grid g;
  const CellsAndFaces open = axisymmetric_mesh(g.radii, g.elevations, {}, {"top"});
  const CellsAndFaces walled =
      axisymmetric_mesh(g.radii, g.elevations, {{0.10, 0.05, true}}, {"ring", "outside"});
  CHECK(open.faces.size() == 5 * 5 + 6 * 4);
  CHECK(walled.faces.size() == open.faces.size() - 2);
  for (int j = 0; j < 5; ++j) {
    CAPTURE(j);
    CHECK((face_between(walled, g.cell(2, j), g.cell(3, j)) == nullptr) == (j < 2));
    CHECK(face_between(walled, g.cell(1, j), g.cell(2, j)) != nullptr);
  }
}

TEST_CASE("axisymmetric mesh: three faces at the foot carry the correction, no other",
          "[solver][mesh]") {
  const std::vector<double> radii = equal_edges(0.0, 0.2, 10), z = equal_edges(0.0, -0.2, 10);
  const CellsAndFaces open = axisymmetric_mesh(radii, z, {}, {"top"});
  const CellsAndFaces walled =
      axisymmetric_mesh(radii, z, {{0.10, 0.06, true}}, {"ring", "outside"});
  int corrected = 0;
  for (const Face& f : walled.faces) {
    const double ratio = f.transmissibility / face_between(open, f.a, f.b)->transmissibility;
    if (ratio == 1.0) continue;
    ++corrected;
    CHECK(ratio == Approx(1.5537740).epsilon(1e-7));  // see tip_correction_test.cpp
    const auto& c = walled.drawing.centres[static_cast<std::size_t>(f.a)];
    CHECK(std::abs(c[0] - 0.10) < 0.011);
    CHECK(std::abs(c[1] + 0.06) < 0.011);
  }
  CHECK(corrected == 3);
}

TEST_CASE("axisymmetric mesh: radial resistance is that of rings", "[solver][mesh]") {
  const Grid g;
  const CellsAndFaces m = axisymmetric_mesh(g.radii, g.elevations, {}, {"top"});
  // Series of resistances from the innermost centre to the side: ln(R / r) / (2 pi height).
  double resistance = 0.0;
  for (int i = 0; i < 5; ++i)
    resistance += 1.0 / face_between(m, g.cell(i, 1), g.cell(i + 1, 1))->transmissibility;
  for (const BoundaryFace& b : m.boundary)
    if (b.cell == g.cell(5, 1) && m.patches[static_cast<std::size_t>(b.patch)] == "side")
      resistance += 1.0 / b.transmissibility;
  const double innermost = m.drawing.centres[static_cast<std::size_t>(g.cell(0, 1))][0];
  CHECK(resistance == Approx(std::log(0.4 / innermost) / (2 * pi * 0.03)).epsilon(1e-12));
}

TEST_CASE("axisymmetric mesh: rises add up to the depth and normals point out", "[solver][mesh]") {
  const Grid g;
  const CellsAndFaces m = axisymmetric_mesh(g.radii, g.elevations, {}, {"top"});
  double fall = 0.0;
  for (int j = 0; j < 4; ++j) {
    const Face* f = face_between(m, g.cell(3, j), g.cell(3, j + 1));
    REQUIRE(f != nullptr);
    CHECK(f->rise == Approx(m.elevation[static_cast<std::size_t>(f->a)] -
                            m.elevation[static_cast<std::size_t>(f->b)]));
    fall += f->rise;
  }
  for (const BoundaryFace& b : m.boundary) {
    const std::string& patch = m.patches[static_cast<std::size_t>(b.patch)];
    CHECK(b.normal_down == (patch == "top" ? -1.0 : patch == "bottom" ? 1.0 : 0.0));
    if (b.cell == g.cell(3, 0) && patch == "top") fall -= b.rise;
    if (b.cell == g.cell(3, 4) && patch == "bottom") fall += b.rise;
    if (patch == "top") CHECK(b.elevation == 0.0);
    if (patch == "bottom") CHECK(b.elevation == -0.4);
  }
  CHECK(fall == Approx(0.4).epsilon(1e-13));
}

TEST_CASE("axisymmetric mesh: a ring on the surface gets a strip and its own correction",
          "[solver][mesh]") {
  const Grid g;
  const std::vector<Wall> walls{{0.10, 0.0, true}, {0.13, 0.0, false}};
  const CellsAndFaces m =
      axisymmetric_mesh(g.radii, g.elevations, walls, {"ring", "wall", "outside"});
  const CellsAndFaces open = axisymmetric_mesh(g.radii, g.elevations, {}, {"top"});
  CHECK(m.faces.size() == open.faces.size());
  CHECK(area_of(m, "wall") == Approx(pi * (0.13 * 0.13 - 0.10 * 0.10)).epsilon(1e-12));
  const auto ratio = [&](int a, int b) {
    return face_between(m, a, b)->transmissibility / face_between(open, a, b)->transmissibility;
  };
  CHECK(ratio(g.cell(2, 0), g.cell(3, 0)) > 1.2);
  CHECK(ratio(g.cell(3, 0), g.cell(4, 0)) > 1.2);
  CHECK(ratio(g.cell(1, 0), g.cell(2, 0)) == 1.0);
}

TEST_CASE("axisymmetric mesh refuses walls off the edges and misnamed surfaces", "[solver][mesh]") {
  const Grid g;
  CHECK_THROWS_AS(
      axisymmetric_mesh(g.radii, g.elevations, {{0.11, 0.05, true}}, {"ring", "outside"}),
      std::invalid_argument);
  CHECK_THROWS_AS(
      axisymmetric_mesh(g.radii, g.elevations, {{0.10, 0.06, true}}, {"ring", "outside"}),
      std::invalid_argument);
  CHECK_THROWS_AS(axisymmetric_mesh(g.radii, g.elevations, {{0.10, 0.05, true}}, {"ring"}),
                  std::invalid_argument);
}

TEST_CASE("column and plane meshes: volumes, resistances, patches", "[solver][mesh]") {
  const std::vector<double> z{0.0, -0.1, -0.25, -0.5, -1.0};
  const CellsAndFaces column = column_mesh(z, 2.0);
  CHECK(column.cells() == 4);
  CHECK(column.faces.size() == 3);
  CHECK(sum(column.volume) == Approx(2.0));
  CHECK(column.patches == std::vector<std::string>{"top", "bottom"});
  double resistance = 0.0;
  for (const Face& f : column.faces) resistance += 1.0 / f.transmissibility;
  for (const BoundaryFace& b : column.boundary) resistance += 1.0 / b.transmissibility;
  CHECK(resistance == Approx(1.0 / 2.0).epsilon(1e-13));

  const CellsAndFaces plane = plane_mesh({0.0, 0.2, 0.6}, z);
  CHECK(plane.cells() == 8);
  CHECK(plane.faces.size() == 2 * 3 + 4);
  CHECK(sum(plane.volume) == Approx(0.6));
  CHECK(plane.patches == std::vector<std::string>{"top", "bottom", "left", "right"});
  CHECK(area_of(plane, "left") == Approx(1.0));
  CHECK(area_of(plane, "right") == Approx(1.0));
}

TEST_CASE("without gravity the body keeps its volumes and loses its heights", "[solver][mesh]") {
  const Grid g;
  const CellsAndFaces m = axisymmetric_mesh(g.radii, g.elevations, {}, {"top"});
  const CellsAndFaces flat = without_gravity(m);
  CHECK(flat.volume == m.volume);
  for (std::size_t i = 0; i < m.faces.size(); ++i) {
    CHECK(flat.faces[i].rise == 0.0);
    CHECK(flat.faces[i].transmissibility == m.faces[i].transmissibility);
  }
  for (const BoundaryFace& b : flat.boundary) CHECK((b.rise == 0.0 && b.normal_down == 0.0));
}

// Resistance of the part of a ring between two radii: ln(outer / inner); of a plane slab: its
// thickness.
TEST_CASE("faces know which part of the resistance lies on either side", "[solver][mesh]") {
  const Grid g;
  const CellsAndFaces m =
      axisymmetric_mesh(g.radii, g.elevations, {{0.10, 0.05, true}}, {"ring", "outside"});
  for (const Face& f : m.faces) {
    const auto& a = m.drawing.centres[static_cast<std::size_t>(f.a)];
    const auto& b = m.drawing.centres[static_cast<std::size_t>(f.b)];
    CAPTURE(a[0], a[1], b[0], b[1]);
    CHECK(f.horizontal == (f.rise == 0.0));
    if (f.rise > 0.0) {  // below a lies b, between them an edge
      const double edge = *std::find_if(g.elevations.begin(), g.elevations.end(),
                                        [&](double z) { return z < a[1]; });
      CHECK(f.part_a == Approx((a[1] - edge) / (a[1] - b[1])).epsilon(1e-12));
    } else {
      const double edge =
          *std::find_if(g.radii.begin(), g.radii.end(), [&](double r) { return r > a[0]; });
      CHECK(f.part_a == Approx(std::log(edge / a[0]) / std::log(b[0] / a[0])).epsilon(1e-12));
    }
  }
  const CellsAndFaces plane = plane_mesh({0.0, 1.0, 4.0}, {0.0, -1.0});
  REQUIRE(plane.faces.size() == 1);
  CHECK(plane.faces[0].part_a == Approx(0.5 / 2.0).epsilon(1e-12));
}

TEST_CASE("a wall may go without the correction", "[solver][mesh]") {
  const Grid g;
  const CellsAndFaces open = axisymmetric_mesh(g.radii, g.elevations, {}, {"top"});
  for (double depth : {0.0, 0.05}) {
    const CellsAndFaces m = axisymmetric_mesh(
        g.radii, g.elevations, {{.radius = 0.10, .depth = depth, .corrected = false}},
        {"ring", "outside"});
    CHECK(area_of(m, "ring") == Approx(pi * 0.1 * 0.1).epsilon(1e-13));
    for (const Face& f : m.faces)
      CHECK(f.transmissibility == face_between(open, f.a, f.b)->transmissibility);
  }
}
