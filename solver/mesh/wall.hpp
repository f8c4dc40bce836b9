#pragma once
#include "solver/mesh/tip_correction.hpp"

namespace ringwright::solver {

/// A thin impermeable cylinder around the axis, from the surface down, or (depth 0) a circle on
/// the surface where a pond meets a closed strip or another pond.
struct Wall {
  double radius = 0.0;      ///< [m]
  double depth = 0.0;       ///< of its foot below the surface [m]; 0: a pond ends here
  bool pond_inside = true;  ///< for depth 0: which side is open to water
  bool corrected = true;    ///< the faces at the foot, or at the edge of the pond, carry the tip
                            ///< factor; false also where nothing ends but the name of a patch
  TipGround ground = {};    ///< materials that meet at the foot
};

}  // namespace ringwright::solver
