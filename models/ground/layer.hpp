#pragma once
/// Ground that is not one uniform soil. Depths count from the surface the ring stands on.

#include <optional>
#include <string>

#include "models/soil/curves.hpp"

namespace ringwright::models {

/// A layer from `top` down to the next one.
struct Layer {
  double top = 0.0;  ///< depth of its upper edge [m]
  Soil soil;
  double initial_head = 0.0;  ///< before the test [m], < 0; unused where the state is hydrostatic
  std::string name;
};

/// Soil disturbed by driving the ring, on both sides of every wall, down to its foot.
struct DisturbedSoil {
  double width = 0.0;   ///< on each side [m], > 0
  double factor = 1.0;  ///< on Ks [-], > 0
};

/// An open gap along both sides of a wall and round its foot, through which water runs as between
/// two plates. See models/ground/wall_gap.hpp for its curves.
struct WallGap {
  double width = 0.0;  ///< on each side [m], > 0
};

}  // namespace ringwright::models
