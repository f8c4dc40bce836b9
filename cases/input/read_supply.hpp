#pragma once
/// What brings the water and what takes it away: `supply`, `reservoir`, `when empty`,
/// `evaporation`.

#include "cases/input/case_test.hpp"
#include "cases/input/test_section.hpp"

namespace ringwright::cases {

/// Fills the supply of every ring of the test.
void read_supply(const TestSection& section, Test& test, Reading& reading);

/// Warns of a reservoir that does not fill the ring. Needs heads and rings.
void warn_of_small_reservoir(const TestSection& section, const Test& test, Reading& reading);

/// Open water of the (inner) ring and what is joined to it, at its vessel [m2].
double vessel_area(const Test& test);

/// Water in ring and vessel at a head [m3].
double filling_volume(const Test& test, double head);

}  // namespace ringwright::cases
