#pragma once
/// A moisture against the soils that are to have it.

#include <string>

#include "cases/input/case_ground.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// Reports a content that is not between theta_r and theta_s of every soil, and a suction at which
/// one is still saturated.
/// @param moisture_key where it is given, empty for a default
/// @param soil_key where the soil is given
void check_moisture(const SectionReader& section, const std::string& moisture_key,
                    const std::string& soil_key, const GroundLayer& layer, Reading& reading);

/// At pressure head h a soil has nothing left to fill.
bool is_saturated(const models::Soil& soil, double h);

}  // namespace ringwright::cases
