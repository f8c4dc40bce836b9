#pragma once
/// A lid and what presses the water under it, or where a falling level falls.

#include "cases/input/case_test.hpp"
#include "cases/input/read_heads.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// Fills lid and vessel of the test; reports pressure without a lid.
void read_lid(const SectionReader& section, Test& test, Reading& reading);

/// Reports heads that the lid does not go with: below its own depth, above its relief; warns of
/// what is not stated.
void check_lid(const SectionReader& section, const Test& test, const HeadWords& heads,
               Reading& reading);

}  // namespace ringwright::cases
