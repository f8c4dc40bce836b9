#pragma once
/// The key `minimum capillary height` of van Genuchten soils.

#include <optional>
#include <span>
#include <string_view>

#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// h_s as given [m], none for the default of each soil, which is then listed as assumed.
/// Reports a height so near 0 that a soil among `n` cannot be computed with it.
/// @param n of the soils it is for; @param n_key where n is from
std::optional<double> read_minimum_capillary_height(const SectionReader& ground,
                                                    std::span<const double> n,
                                                    std::string_view n_key, Reading& reading);

/// Reports the key where the soil has no van Genuchten curve. @param curve its name
void refuse_minimum_capillary_height(const SectionReader& ground, std::string_view curve,
                                     const Place& curve_place, Reading& reading);

}  // namespace ringwright::cases
