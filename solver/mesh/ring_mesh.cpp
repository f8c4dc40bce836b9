#include "solver/mesh/ring_mesh.hpp"

#include <algorithm>

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
  std::vector<double> inwards = graded_one_end(a, 0.0, tip, growth);
  std::reverse(inwards.begin(), inwards.end());
  inwards.front() = 0.0;
  std::vector<double> radii = inwards, elevations;
  append(radii, graded_one_end(a, domain.radius, tip, growth));
  if (d > 0.0) append(elevations, graded_both_ends(0.0, -d, resolution.top_cell, tip, growth));
  append(elevations,
         graded_one_end(-d, -domain.depth, d > 0.0 ? tip : resolution.top_cell, growth));
  return axisymmetric_mesh(split(radii, resolution.splits), split(elevations, resolution.splits),
                           {{a, d}}, {"ring", "outside"});
}

}  // namespace ringwright::solver
