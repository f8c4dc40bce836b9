#include "solver/mesh/ring_soils.hpp"

#include <algorithm>
#include <cmath>

#include "solver/ground_materials.hpp"
#include "solver/mesh/ring_walls.hpp"

namespace ringwright::solver {
namespace {

// From the nearest wall whose foot, or what lies `below` it, is deeper.
double distance_from_wall(const TestSetup& setup, double radius, double depth, double below) {
  double distance = INFINITY;
  for (const models::SingleRing& ring : rings_of(setup))
    if (ring.insertion > 0.0 && depth < ring.insertion + below)
      distance = std::min(distance, std::abs(radius - ring.radius));
  return distance;
}

}  // namespace

int layer_at(const TestSetup& setup, double depth) {
  int layer = 0;
  for (const models::Layer& below : setup.layers_below) layer += depth >= below.top;
  return layer;
}

const models::Soil& layer_soil(const TestSetup& setup, int layer) {
  return layer == 0 ? setup.soil : setup.layers_below[static_cast<std::size_t>(layer) - 1].soil;
}

int soil_at(const TestSetup& setup, double radius, double depth) {
  const double gap = setup.gap ? setup.gap->width : 0.0;
  if (distance_from_wall(setup, radius, depth, gap) < gap) return gap_index(setup);
  const int layer = layer_at(setup, depth);
  if (setup.disturbed &&
      distance_from_wall(setup, radius, depth, 0.0) < gap + setup.disturbed->width)
    return disturbed_index(setup, layer);
  return layer_index(setup, layer);
}

void set_soils(const TestSetup& setup, CellsAndFaces& mesh) {
  for (std::size_t c = 0; c < mesh.soil.size(); ++c)
    mesh.soil[c] = soil_at(setup, mesh.drawing.centres[c][0], -mesh.drawing.centres[c][1]);
}

}  // namespace ringwright::solver
