#pragma once
#include <nlohmann/json.hpp>

#include "postprocess/reading/answer.hpp"

namespace ringwright::postprocess {

/// {"value", "unit"}
inline nlohmann::json quantity(double value, const char* unit) {
  return {{"value", value}, {"unit", unit}};
}

/// {"value", "error", "unit"}
inline nlohmann::json figure(const Figure& from, const char* unit) {
  return {{"value", from.value}, {"error", from.error}, {"unit", unit}};
}

}  // namespace ringwright::postprocess
