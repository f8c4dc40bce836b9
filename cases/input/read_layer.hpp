#pragma once
/// One soil of the ground and its moisture: the keys of `ground:` itself or of one of its layers.

#include <optional>

#include "cases/input/case_ground.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// A water table that shapes the moisture of the whole ground.
struct TableWords {
  double depth = 0.0;  ///< below the test level [m]
  Place place;         ///< where it is given
  bool stays = false;  ///< a water table, not only a state before the test
};

/// What the soils of a ground share.
struct GroundContext {
  double test_level = 0.0;           ///< below ground [m]
  std::optional<TableWords> table;   ///< none: every layer has a moisture of its own
  std::optional<Moisture> moisture;  ///< of layers that name none
  double specific_storage = 0.0;     ///< [1/m]
  bool is_layer = false;             ///< not the section `ground:` itself
};

/// @param depth of its upper edge below the test level [m]
/// @param where the key of the section, for what is missing
/// @return what could be read; without variants if something was reported
GroundLayer read_layer(const SectionReader& section, const Place& where, double depth,
                       const GroundContext& context, Reading& reading);

}  // namespace ringwright::cases
