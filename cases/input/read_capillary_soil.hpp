#pragma once
/// A soil by its capillary length (or alpha*), fillable porosity and Kfs.

#include <optional>
#include <string>
#include <vector>

#include "cases/input/case.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// A Gardner soil whose K(h) = Kfs exp(h / length), with theta_r = 0 and theta_s such that
/// from `suction` to saturation it takes up just the fillable porosity. Its water contents count
/// the water that moves, not all the water in the ground.
/// @param key "capillary length" or "alpha star"
/// @param suction before the test [m]; none if the moisture was given otherwise (reported)
/// @return the one soil; empty if something was reported
std::vector<SoilVariant> read_capillary_soil(const SectionReader& ground, const std::string& key,
                                             std::optional<double> suction, Reading& reading);

}  // namespace ringwright::cases
