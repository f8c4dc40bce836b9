#pragma once
/// The walls of a test's rings and the names of the surface between them.

#include <string>
#include <vector>

#include "solver/mesh/wall.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::solver {

struct RingWalls {
  std::vector<Wall> walls;           ///< ascending in radius
  std::vector<std::string> surface;  ///< one more than walls
};

/// Rings that stand in the ground are walls; one on the surface covers a closed strip of its own
/// thickness. An inner ring on the surface between ponds that always stand equally high divides
/// nothing: only the names "ring" and "annulus" change there.
/// @throws std::invalid_argument for a ring on the surface whose wall has no thickness, an outer
/// ring that does not enclose the inner one
RingWalls ring_walls(const TestSetup& setup);

/// True where the water stands equally high in both rings at all times, by their programs.
bool has_equal_ponds(const TestSetup& setup);

/// True for an inner ring on the surface between equal ponds.
bool inner_ring_divides_nothing(const TestSetup& setup);

/// Depths and radii closer than this count as one [m]: nobody sets a ring or knows a layer to a
/// tenth of a millimetre.
constexpr double kSameDepth = 1e-4;

/// Square root of horizontal over vertical conductivity at the foot of a ring [-].
double stretch_at_foot(const TestSetup& setup, const models::SingleRing& ring);

/// The rings from the axis outwards.
std::vector<models::SingleRing> rings_of(const TestSetup& setup);

}  // namespace ringwright::solver
