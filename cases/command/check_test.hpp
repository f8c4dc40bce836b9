#pragma once
#include <string>

#include "cases/input/case_test.hpp"

namespace ringwright::cases {

/// One test as it will run: rings, lid, stages, supply, stop rules, in paragraphs.
std::string test_words(const Test& test);

}  // namespace ringwright::cases
