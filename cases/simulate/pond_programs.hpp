#pragma once
/// What is done with the water of each ring, as the solver is told it.

#include <cstddef>

#include "cases/input/case.hpp"
#include "models/protocol/pond_program.hpp"

namespace ringwright::cases {

/// Of the (inner) ring; without stages where one head is held and nothing moves it.
models::PondProgram pond_program(const Test& test);
/// Of the outer ring.
models::PondProgram outer_pond_program(const Test& test);

/// Which reading of the soil a variant is, by its source; the first if it is none of them.
std::size_t variant_index(const Ground& ground, const SoilVariant& variant);

}  // namespace ringwright::cases
