#pragma once
#include <optional>
#include <vector>

#include "solver/flow/conditions.hpp"
#include "solver/mesh/cells_and_faces.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::solver {

/// The patches of a ring mesh by meaning.
struct RingPatches {
  std::size_t ring, outside, bottom, side;  ///< indices into CellsAndFaces::patches
  std::optional<std::size_t> annulus;       ///< of a double ring
};

/// @throws std::invalid_argument for a mesh that is not a ring mesh
RingPatches ring_patches(const CellsAndFaces& mesh);

/// The ground around the rings: open to the air outside; free drainage far below, or a water table
/// that stays where it is far outside, over a closed bottom. The rings themselves are closed.
std::vector<Condition> ground_conditions(const CellsAndFaces& mesh, const TestSetup& setup);

}  // namespace ringwright::solver
