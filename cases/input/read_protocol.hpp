#pragma once
/// How a test is run and read: the keys that may stand in a test or beside all tests, and the
/// stages they end.

#include "cases/input/case_test.hpp"
#include "cases/input/read_heads.hpp"
#include "cases/input/test_section.hpp"

namespace ringwright::cases {

/// Fills stages, stop rules, readings and gauge of a test whose rings and lid are known, from its
/// own keys, else the common ones, else the defaults, which are listed as assumed; reports readings
/// that do not fit.
void read_protocol(const TestSection& section, const HeadWords& heads, Test& test,
                   Reading& reading);

}  // namespace ringwright::cases
