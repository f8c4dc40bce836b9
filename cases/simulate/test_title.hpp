#pragma once
#include <string>

#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {

/// Program and job, then the test in one sentence: ring or rings, ground, heads, water.
std::string test_title(const Case& what, const Test& test);

}  // namespace ringwright::cases
