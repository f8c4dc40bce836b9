#pragma once
/// The section `tests:`.

#include <vector>

#include "cases/input/case_ground.hpp"
#include "cases/input/case_test.hpp"
#include "cases/input/located_yaml.hpp"
#include "cases/input/read_ground.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// The ground the tests stand on, and where its parts are given.
struct GroundRead {
  const Ground& ground;
  const GroundPlaces& places;
};

/// @param where place of the key `tests`
/// @return what could be read; complete if no problem was reported
std::vector<Test> read_tests(const LocatedNode& node, const Place& where, const Key& grammar,
                             const GroundRead& ground, Reading& reading);

}  // namespace ringwright::cases
