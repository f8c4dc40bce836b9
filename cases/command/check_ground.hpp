#pragma once
#include <string>

#include "cases/input/case.hpp"

namespace ringwright::cases {

/// The ground as the test stands on it: one paragraph for each layer and reading of its soil, then
/// what holds for all of it.
std::string ground_words(const Case& what);

}  // namespace ringwright::cases
