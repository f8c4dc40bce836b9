#pragma once
#include <string>
#include <vector>

namespace ringwright::solver {

/// A thin impermeable cylinder around the axis, from the surface down.
struct Wall {
  double radius = 0.0;  ///< [m]
  double depth = 0.0;   ///< of its foot below the surface [m]; 0: it only bounds the pond
};

}  // namespace ringwright::solver
