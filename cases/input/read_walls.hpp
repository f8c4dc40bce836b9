#pragma once
/// What driving the ring does to the ground: `disturbed` and `wall gap`.

#include "cases/input/case_ground.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

void read_walls(const SectionReader& section, Ground& ground);

}  // namespace ringwright::cases
