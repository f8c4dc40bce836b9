#pragma once
namespace ringwright::solver {

/// A thin impermeable cylinder around the axis, from the surface down, or (depth 0) a circle on
/// the surface where a pond meets a closed strip.
struct Wall {
  double radius = 0.0;      ///< [m]
  double depth = 0.0;       ///< of its foot below the surface [m]; 0: a pond ends here
  bool pond_inside = true;  ///< for depth 0: which side is open to water
};

}  // namespace ringwright::solver
