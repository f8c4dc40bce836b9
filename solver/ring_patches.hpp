#pragma once
#include <vector>

#include "solver/flow/conditions.hpp"
#include "solver/mesh/cells_and_faces.hpp"

namespace ringwright::solver {

/// The patches of a ring mesh by meaning.
struct RingPatches {
  std::size_t ring, outside, bottom;  ///< indices into CellsAndFaces::patches
};

/// @throws std::invalid_argument for a mesh that is not a ring mesh
RingPatches ring_patches(const CellsAndFaces& mesh);

/// Ponded ring at a constant head [m], outside open to the air, free drainage far below.
std::vector<Condition> ring_conditions(const CellsAndFaces& mesh, double pond_head);

}  // namespace ringwright::solver
