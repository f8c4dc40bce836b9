#pragma once
#include <string>

#include "cases/input/case_ground.hpp"

namespace ringwright::cases {

/// Layers, water table, wall and liner of ground that is not uniform, depths from the level the
/// test stands on; empty for uniform ground.
std::string ground_below(const Ground& ground);

}  // namespace ringwright::cases
