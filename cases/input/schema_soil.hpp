#pragma once
/// The keys that give one soil and its moisture, of the ground or of a layer.

#include "cases/input/schema.hpp"

namespace ringwright::cases {

std::vector<Key> soil_keys();

}  // namespace ringwright::cases
