#include "solver/mesh/cells_and_faces.hpp"

#include <algorithm>

namespace ringwright::solver {

CellsAndFaces without_gravity(CellsAndFaces mesh) {
  std::fill(mesh.elevation.begin(), mesh.elevation.end(), 0.0);
  for (Face& f : mesh.faces) f.rise = 0.0;
  for (BoundaryFace& f : mesh.boundary) f.rise = f.normal_down = 0.0;
  return mesh;
}

}  // namespace ringwright::solver
