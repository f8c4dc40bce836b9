#pragma once
/// The graded axisymmetric mesh of a ring test.

#include "models/ring/single_ring.hpp"
#include "solver/domain.hpp"
#include "solver/mesh/cells_and_faces.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::solver {

/// Patches: "ring", "outside", "bottom", "side", and "wall", the strip under a ring that stands
/// on the surface.
/// @throws std::invalid_argument for a ring on the surface whose wall has no thickness
CellsAndFaces ring_mesh(const models::SingleRing& ring, const Domain& domain,
                        const Resolution& resolution);

}  // namespace ringwright::solver
