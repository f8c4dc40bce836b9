#pragma once
/// The soil of the section `ground:`, in any of the ways it may be given.

#include <optional>
#include <string>
#include <vector>

#include "cases/input/case.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// "silt loam, moist" taken apart.
struct TextureWords {
  std::string texture;
  std::optional<std::string> moisture;
};

/// The value of `texture`; none if absent or reported.
std::optional<TextureWords> read_texture(const SectionReader& ground);

/// Which key gives the soil: "texture", "parameters", "capillary length" or "alpha star"; empty
/// if none or several do, which is reported.
std::string soil_key(const SectionReader& ground, const Place& where, Reading& reading);

/// The soils meant, one per published table for a texture; empty if something was reported.
/// @param key from soil_key(); @param suction before the test, if known [m]
std::vector<SoilVariant> read_soil(const SectionReader& ground, const std::string& key,
                                   const std::optional<TextureWords>& texture,
                                   std::optional<double> suction, Reading& reading);

}  // namespace ringwright::cases
