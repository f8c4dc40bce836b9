#pragma once
/// The keys of a test that may also stand beside all tests, for those that do not name them.

#include "cases/input/schema.hpp"

namespace ringwright::cases {

std::vector<Key> protocol_keys();

}  // namespace ringwright::cases
