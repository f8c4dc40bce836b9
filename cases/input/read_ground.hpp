#pragma once
/// The section `ground:`.

#include <optional>

#include "cases/input/case_ground.hpp"
#include "cases/input/located_yaml.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// Where in the file things stand that a test may contradict.
struct GroundPlaces {
  std::optional<Place> water_table, liner, truth;
};

/// @param where place of the key `ground`
/// @param places filled in
/// @return what could be read; complete if no problem was reported
Ground read_ground(const LocatedNode& node, const Place& where, const Key& grammar,
                   GroundPlaces& places, Reading& reading);

}  // namespace ringwright::cases
