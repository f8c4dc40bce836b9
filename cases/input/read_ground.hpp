#pragma once
/// The section `ground:`.

#include "cases/input/case.hpp"
#include "cases/input/located_yaml.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// @param where place of the key `ground`
/// @return what could be read; complete if no problem was reported
Ground read_ground(const LocatedNode& node, const Place& where, const Key& grammar,
                   Reading& reading);

}  // namespace ringwright::cases
