#include "solver/mesh/axisymmetric.hpp"

#include <cmath>
#include <numbers>
#include <stdexcept>

#include "solver/mesh/grading.hpp"
#include "solver/mesh/tip_correction.hpp"

namespace ringwright::solver {
namespace {

constexpr double pi = std::numbers::pi;

// A structured section: what differs between a plane and a rotated one is the three
// functions of area and volume.
struct Section {
  std::vector<double> x, z;  // edges
  bool rotated = false;
  CellsAndFaces mesh = {};
  std::vector<double> x_centres = graded_centres(x), z_centres = graded_centres(z);

  int columns() const { return static_cast<int>(x.size()) - 1; }
  int rows() const { return static_cast<int>(z.size()) - 1; }
  int cell(int i, int j) const { return j * columns() + i; }
  double xc(int i) const { return x_centres[i]; }
  double zc(int j) const { return z_centres[j]; }
  double height(int j) const { return z[j] - z[j + 1]; }
  double plan_area(int i) const {
    return rotated ? pi * (x[i + 1] - x[i]) * (x[i + 1] + x[i]) : x[i + 1] - x[i];
  }
  // Side area over distance; between rings the exact radial resistance ln(r_b / r_a).
  double side_transmissibility(double at, double from, double to, int j) const {
    if (!rotated) return height(j) / (to - from);
    return from > 0.0 ? 2 * pi * height(j) / std::log(to / from)
                      : 2 * pi * at * height(j) / (to - from);
  }
  // Part of that resistance between `from` and the face.
  double side_part(double at, double from, double to) const {
    return rotated && from > 0.0 ? std::log(at / from) / std::log(to / from)
                                 : (at - from) / (to - from);
  }
  double side_area(double at, int j) const { return rotated ? 2 * pi * at * height(j) : height(j); }
};

void add_cells(Section& s) {
  CellsAndFaces& m = s.mesh;
  for (int j = 0; j < s.rows(); ++j)
    for (int i = 0; i < s.columns(); ++i) {
      m.volume.push_back(s.plan_area(i) * s.height(j));
      m.elevation.push_back(s.zc(j));
      m.soil.push_back(0);
      m.drawing.centres.push_back({s.xc(i), s.zc(j)});
      const int nx = s.columns() + 1, p = j * nx + i;
      m.drawing.cells.push_back({p + nx, p + nx + 1, p + 1, p});
    }
  for (double z : s.z)
    for (double x : s.x) m.drawing.points.push_back({x, z});
}

void add_vertical_flow(Section& s) {
  for (int j = 0; j + 1 < s.rows(); ++j)
    for (int i = 0; i < s.columns(); ++i) {
      const double rise = s.zc(j) - s.zc(j + 1);
      s.mesh.faces.push_back({s.cell(i, j), s.cell(i, j + 1), s.plan_area(i) / rise, rise,
                              (s.zc(j) - s.z[j + 1]) / rise});
    }
}

bool behind_wall(const std::vector<Wall>& walls, double x, double z_centre) {
  for (const Wall& w : walls)
    if (std::abs(x - w.radius) < 1e-9 * (1 + w.radius) && -z_centre < w.depth) return true;
  return false;
}

void add_horizontal_flow(Section& s, const std::vector<Wall>& walls) {
  for (int j = 0; j < s.rows(); ++j)
    for (int i = 0; i + 1 < s.columns(); ++i) {
      if (behind_wall(walls, s.x[i + 1], s.zc(j))) continue;
      s.mesh.faces.push_back({s.cell(i, j), s.cell(i + 1, j),
                              s.side_transmissibility(s.x[i + 1], s.xc(i), s.xc(i + 1), j), 0.0,
                              s.side_part(s.x[i + 1], s.xc(i), s.xc(i + 1)), true});
    }
}

int patch(CellsAndFaces& m, const std::string& name) {
  for (std::size_t i = 0; i < m.patches.size(); ++i)
    if (m.patches[i] == name) return static_cast<int>(i);
  m.patches.push_back(name);
  return static_cast<int>(m.patches.size()) - 1;
}

void add_top_and_bottom(Section& s, const std::vector<Wall>& walls,
                        const std::vector<std::string>& surface) {
  for (int i = 0; i < s.columns(); ++i) {
    std::size_t stretch = 0;
    while (stretch < walls.size() && s.xc(i) > walls[stretch].radius) ++stretch;
    const double half = 0.5 * s.height(0), area = s.plan_area(i);
    s.mesh.boundary.push_back({s.cell(i, 0), patch(s.mesh, surface[stretch]), area / half, -half,
                               area, -1.0, s.z.front(), s.xc(i)});
  }
  const int last = s.rows() - 1;
  for (int i = 0; i < s.columns(); ++i) {
    const double half = 0.5 * s.height(last), area = s.plan_area(i);
    s.mesh.boundary.push_back({s.cell(i, last), patch(s.mesh, "bottom"), area / half, half, area,
                               1.0, s.z.back(), s.xc(i)});
  }
}

void add_side(Section& s, bool right, const std::string& name) {
  const int i = right ? s.columns() - 1 : 0;
  const double at = right ? s.x.back() : s.x.front();
  for (int j = 0; j < s.rows(); ++j) {
    const double from = right ? s.xc(i) : at, to = right ? at : s.xc(i);
    s.mesh.boundary.push_back({s.cell(i, j), patch(s.mesh, name),
                               s.side_transmissibility(at, from, to, j), 0.0, s.side_area(at, j),
                               0.0, s.zc(j), s.zc(j), true});
  }
}

int edge_index(const std::vector<double>& edges, double value) {
  for (std::size_t i = 0; i < edges.size(); ++i)
    if (std::abs(edges[i] - value) < 1e-9 * (1 + std::abs(value))) return static_cast<int>(i);
  throw std::invalid_argument("a wall does not lie on the edges of the mesh");
}

Face& face_between(CellsAndFaces& m, int a, int b) {
  for (Face& f : m.faces)
    if (f.a == a && f.b == b) return f;
  throw std::logic_error("no face between two neighbouring cells");
}

void correct_tip(Section& s, const Wall& w) {
  const int i = edge_index(s.x, w.radius), j = edge_index(s.z, -w.depth);
  // real axis down, imaginary axis outwards
  const auto at = [&](double x, double z) { return TipPoint(-w.depth - z, x - w.radius); };
  const auto centre = [&](int k, int l) { return at(s.xc(k), s.zc(l)); };
  const auto correct = [&](int k, int l, int k2, int l2, double factor) {
    face_between(s.mesh, s.cell(k, l), s.cell(k2, l2)).transmissibility *= factor;
  };
  if (w.ground.one_isotropic_soil()) {
    const auto factor = [&](int k, int l, int k2, int l2, TipPoint end) {
      correct(k, l, k2, l2, tip_factor(0.0, end, centre(k, l), centre(k2, l2)));
    };
    factor(i - 1, j - 1, i - 1, j, at(s.x[i - 1], -w.depth));
    factor(i, j - 1, i, j, at(s.x[i + 1], -w.depth));
    factor(i - 1, j, i, j, at(w.radius, s.z[j + 1]));
    return;
  }
  const TipField field(w.ground);
  for (int k : {i - 1, i})
    correct(k, j - 1, k, j,
            field.factor_beside(s.x[k + 1] - s.x[k], centre(k, j - 1), centre(k, j)));
  correct(i - 1, j, i, j, field.factor_below(s.height(j), centre(i - 1, j), centre(i, j)));
}

void correct_pond_edge(Section& s, const Wall& w) {
  const int outer = edge_index(s.x, w.radius);
  const int wet = w.pond_inside ? outer - 1 : outer, dry = w.pond_inside ? outer : outer - 1;
  // real axis along the pond, imaginary axis down
  const double stretch = w.ground.stretch_below;
  const auto at = [&](double x, double z) {
    return TipPoint((w.pond_inside ? w.radius - x : x - w.radius) / stretch, -z);
  };
  const auto centre = [&](int k) { return at(s.xc(k), s.zc(0)); };
  face_between(s.mesh, s.cell(outer - 1, 0), s.cell(outer, 0)).transmissibility *=
      tip_factor(0.0, at(w.radius, s.z[1]), centre(wet), centre(dry));
  const double far_end = w.pond_inside ? s.x[wet] : s.x[wet + 1];
  for (BoundaryFace& b : s.mesh.boundary)
    if (b.cell == s.cell(wet, 0) && b.normal_down < 0)
      b.transmissibility *= tip_factor(0.0, at(far_end, 0.0), at(s.xc(wet), 0.0), centre(wet));
}

}  // namespace

CellsAndFaces axisymmetric_mesh(const std::vector<double>& radii,
                                const std::vector<double>& elevations,
                                const std::vector<Wall>& walls,
                                const std::vector<std::string>& surface) {
  if (surface.size() != walls.size() + 1)
    throw std::invalid_argument("a surface cut by n walls has n + 1 stretches");
  Section s{radii, elevations, true};
  add_cells(s);
  add_vertical_flow(s);
  add_horizontal_flow(s, walls);
  add_top_and_bottom(s, walls, surface);
  add_side(s, true, "side");
  for (const Wall& w : walls)
    if (w.corrected) w.depth > 0 ? correct_tip(s, w) : correct_pond_edge(s, w);
  return std::move(s.mesh);
}

CellsAndFaces column_mesh(const std::vector<double>& elevations, double area) {
  Section s{{0.0, area}, elevations, false};
  add_cells(s);
  add_vertical_flow(s);
  add_top_and_bottom(s, {}, {"top"});
  return std::move(s.mesh);
}

CellsAndFaces plane_mesh(const std::vector<double>& x, const std::vector<double>& elevations) {
  Section s{x, elevations, false};
  add_cells(s);
  add_vertical_flow(s);
  add_horizontal_flow(s, {});
  add_top_and_bottom(s, {}, {"top"});
  add_side(s, false, "left");
  add_side(s, true, "right");
  return std::move(s.mesh);
}

}  // namespace ringwright::solver
