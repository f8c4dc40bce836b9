#pragma once
/// The rings of a test: diameters, insertions, wall, and what the ring can hold.

#include "cases/input/case_test.hpp"
#include "cases/input/read_heads.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

void read_rings(const SectionReader& section, Test& test, Reading& reading);

/// Reports insertion, heads and freeboard that are more than the ring is high.
void check_height(const SectionReader& section, const Test& test, const HeadWords& heads,
                  Reading& reading);

}  // namespace ringwright::cases
