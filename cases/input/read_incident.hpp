#pragma once
/// Times without water in a ring: the key `incident`.

#include "cases/input/case_test.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// Fills the empty spells of a test whose length is known.
void read_incidents(const SectionReader& section, Test& test, Reading& reading);

}  // namespace ringwright::cases
