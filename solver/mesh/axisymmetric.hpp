#pragma once
/// Mesh of cells and faces of an axisymmetric section with thin walls, and of a column.
///
/// Rectangular cells between given radii and elevations, true volumes and areas of the
/// full circle. A wall is the absence of faces along its radius; the three faces that
/// meet at its foot carry the tip correction unless the wall says no. Patches: one per stretch of
/// the surface between walls ("ring", or "ring 1", ... from the axis outwards, then "outside"),
/// "bottom" and "side".

#include <string>
#include <vector>

#include "solver/mesh/cells_and_faces.hpp"
#include "solver/mesh/wall.hpp"

namespace ringwright::solver {

/// @param radii      edges in r [m], ascending from 0
/// @param elevations edges in z [m], descending from the surface at 0
/// @param walls      ascending in radius; radius and foot must lie on edges
/// @param surface    names of the stretches of surface, one more than walls
CellsAndFaces axisymmetric_mesh(const std::vector<double>& radii,
                                const std::vector<double>& elevations,
                                const std::vector<Wall>& walls,
                                const std::vector<std::string>& surface);

/// A vertical column of the given cross-section [m2]; patches "top" and "bottom".
/// @param elevations edges in z [m], descending
CellsAndFaces column_mesh(const std::vector<double>& elevations, double area = 1.0);

/// A plane section of unit thickness; patches "top", "bottom", "left", "right". @param x ascending
CellsAndFaces plane_mesh(const std::vector<double>& x, const std::vector<double>& elevations);

}  // namespace ringwright::solver
