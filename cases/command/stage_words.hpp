#pragma once
#include <string>
#include <vector>

#include "cases/input/case_test.hpp"

namespace ringwright::cases {

/// A line for each stage: when, what head, how it is reached; none for one constant head.
std::vector<std::string> stage_words(const RingProgram& program);

/// Times without water.
std::vector<std::string> incident_words(const Test& test);

/// Largest flow and reservoir; empty if there is no limit.
std::string supply_words(const models::Supply& supply);

}  // namespace ringwright::cases
