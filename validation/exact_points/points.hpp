#pragma once
#include <fstream>
#include <nlohmann/json.hpp>
#include <string>

namespace ringwright::validation {

/// A table of exact_points/reference.json, in the units its keys name.
inline nlohmann::json exact_points(const std::string& table) {
  std::ifstream file(RINGWRIGHT_SOURCE_DIR "/validation/exact_points/reference.json");
  return nlohmann::json::parse(file).at(table);
}

}  // namespace ringwright::validation
