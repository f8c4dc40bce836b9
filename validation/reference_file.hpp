#pragma once
#include <fstream>
#include <nlohmann/json.hpp>
#include <string>

namespace ringwright::validation {

/// The reference values in a folder of validation/, in the units their keys name.
inline nlohmann::json reference_of(const std::string& folder) {
  std::ifstream file(RINGWRIGHT_SOURCE_DIR "/validation/" + folder + "/reference.json");
  return nlohmann::json::parse(file);
}

}  // namespace ringwright::validation
