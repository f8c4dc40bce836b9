#include "solver/mesh/ring_mesh.hpp"

#include "solver/mesh/axisymmetric.hpp"
#include "solver/mesh/ring_lines.hpp"
#include "solver/mesh/ring_soils.hpp"
#include "solver/mesh/ring_walls.hpp"

namespace ringwright::solver {
namespace {

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

CellsAndFaces ring_mesh(const TestSetup& setup, const Domain& domain,
                        const Resolution& resolution) {
  const RingWalls rings = ring_walls(setup);
  CellsAndFaces mesh =
      axisymmetric_mesh(split(ring_radii(setup, domain, resolution), resolution.splits),
                        split(ring_elevations(setup, domain, resolution), resolution.splits),
                        rings.walls, rings.surface);
  set_soils(setup, mesh);
  return mesh;
}

CellsAndFaces ring_mesh(const models::SingleRing& ring, const Domain& domain,
                        const Resolution& resolution) {
  TestSetup setup;
  setup.ring = ring;
  return ring_mesh(setup, domain, resolution);
}

}  // namespace ringwright::solver
