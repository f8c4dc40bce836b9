#pragma once
/// The graded axisymmetric mesh of a ring test.

#include "models/ring/single_ring.hpp"
#include "solver/domain.hpp"
#include "solver/mesh/cells_and_faces.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::solver {

/// Patches: "ring", "annulus" (between the walls of a double ring), "outside", "bottom", "side",
/// and "wall", the strip under a ring that stands on the surface. Soil indices as in
/// solver/ground_materials.hpp.
/// @throws std::invalid_argument for a ring on the surface whose wall has no thickness, an outer
/// ring that does not enclose the inner one
CellsAndFaces ring_mesh(const TestSetup& setup, const Domain& domain, const Resolution& resolution);

/// The same for a single ring in uniform isotropic ground.
CellsAndFaces ring_mesh(const models::SingleRing& ring, const Domain& domain,
                        const Resolution& resolution);

}  // namespace ringwright::solver
