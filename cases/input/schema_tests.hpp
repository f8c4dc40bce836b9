#pragma once
/// The part of the grammar below `tests:`.

#include "cases/input/schema.hpp"

namespace ringwright::cases {

Key tests_grammar();

}  // namespace ringwright::cases
