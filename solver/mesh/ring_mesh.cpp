#include "solver/mesh/ring_mesh.hpp"

#include <algorithm>
#include <stdexcept>

#include "solver/mesh/axisymmetric.hpp"
#include "solver/mesh/grading.hpp"

namespace ringwright::solver {
namespace {

void append(std::vector<double>& edges, const std::vector<double>& more) {
  edges.insert(edges.end(), more.begin() + (edges.empty() ? 0 : 1), more.end());
}

std::vector<double> split(std::vector<double> edges, int times) {
  for (; times > 0; --times) {
    std::vector<double> halved;
    for (std::size_t i = 0; i + 1 < edges.size(); ++i) {
      halved.push_back(edges[i]);
      halved.push_back(0.5 * (edges[i] + edges[i + 1]));
    }
    halved.push_back(edges.back());
    edges = std::move(halved);
  }
  return edges;
}

}  // namespace

CellsAndFaces ring_mesh(const models::SingleRing& ring, const Domain& domain,
                        const Resolution& resolution) {
  const double a = ring.radius, d = ring.insertion;
  const double tip = resolution.tip_cell, growth = resolution.growth;
  const bool on_surface = d <= 0.0;
  if (on_surface && !(ring.wall > 0.0))
    throw std::invalid_argument("a ring on the surface needs a wall thicker than 0");
  std::vector<double> radii = graded_one_end(a, 0.0, tip, growth), elevations;
  std::reverse(radii.begin(), radii.end());
  radii.front() = 0.0;
  if (on_surface) append(radii, graded_both_ends(a, a + ring.wall, tip, tip, growth));
  append(radii, graded_one_end(radii.back(), domain.radius, tip, growth));
  if (!on_surface)
    append(elevations,
           graded_both_ends(0.0, -d, resolution.top_cell, tip, resolution.growth_inside));
  append(elevations, graded_one_end(-d, -domain.depth, tip, resolution.growth_down));
  std::vector<Wall> walls{{a, d, true}};
  std::vector<std::string> surface{"ring", "outside"};
  if (on_surface) {
    walls.push_back({a + ring.wall, 0.0, false});
    surface = {"ring", "wall", "outside"};
  }
  return axisymmetric_mesh(split(radii, resolution.splits), split(elevations, resolution.splits),
                           walls, surface);
}

}  // namespace ringwright::solver
