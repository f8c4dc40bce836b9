#pragma once
/// How finely the water is read: `gauge`, `reading error`, `seed`.

#include "cases/input/case_test.hpp"
#include "cases/input/test_section.hpp"

namespace ringwright::cases {

/// Fills the reader of a test whose stages, vessel and ruler are known.
void read_gauge(const TestSection& section, Test& test, Reading& reading);

}  // namespace ringwright::cases
