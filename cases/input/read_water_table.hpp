#pragma once
/// Test level, water table and hydrostatic moisture of the ground.

#include <optional>

#include "cases/input/read_layer.hpp"

namespace ringwright::cases {

/// Depth of the level the ring stands on below the ground [m]; 0 if not given.
double read_test_level(const SectionReader& section);

/// The table that shapes the moisture, from `water table` or from "hydrostatic to 2 m"; none if
/// neither is given or something was reported. Fills Ground::water_table.
std::optional<TableWords> read_water_table(const SectionReader& section, Ground& ground,
                                           Reading& reading);

/// Moisture for layers that name none, where the ground has no soil of its own.
std::optional<Moisture> common_moisture(const SectionReader& section, const GroundContext& context,
                                        Reading& reading);

/// Reports a hydrostatic state in which the surface is saturated already.
void check_surface(const SectionReader& section, const Ground& ground, const GroundContext& context,
                   Reading& reading);

}  // namespace ringwright::cases
