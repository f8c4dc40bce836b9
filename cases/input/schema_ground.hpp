#pragma once
/// The part of the grammar below `ground:`.

#include "cases/input/schema.hpp"

namespace ringwright::cases {

Key ground_grammar();

}  // namespace ringwright::cases
