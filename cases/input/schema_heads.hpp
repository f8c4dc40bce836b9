#pragma once
/// The keys that say what is done with the water in the ring.

#include "cases/input/schema.hpp"

namespace ringwright::cases {

std::vector<Key> head_keys();

}  // namespace ringwright::cases
