#include "postprocess/results/json_text.hpp"

#include <algorithm>

namespace ringwright::postprocess {
namespace {

using nlohmann::json;

constexpr int deep = 3;  // deeper than any line goes

// Levels of a value, at most `deep`: 0 for a plain one.
int levels(const json& value, int most = deep) {
  if (!value.is_structured()) return 0;
  int below = 0;
  for (const json& child : value) {
    if (most <= 1) return most;
    below = std::max(below, levels(child, most - 1));
  }
  return 1 + below;
}

std::string line(const json& value) {
  return value.dump(-1, ' ', false, json::error_handler_t::replace);
}

// A long list with its unit.
bool is_column(const json& value) { return value.is_object() && value.contains("values"); }

void put(const json& value, std::size_t indent, bool in_list, std::string& text) {
  if (value.empty() || levels(value) <= (in_list || is_column(value) ? 2 : 1)) {
    text += line(value);
    return;
  }
  const bool is_list = value.is_array();
  text += is_list ? "[" : "{";
  const char* separator = "\n";
  for (const auto& [key, child] : value.items()) {
    text += separator + std::string(indent + 2, ' ');
    if (!is_list) text += line(json(key)) + ": ";
    put(child, indent + 2, is_list, text);
    separator = ",\n";
  }
  text += "\n" + std::string(indent, ' ') + (is_list ? "]" : "}");
}

}  // namespace

std::string json_text(const json& document) {
  std::string text;
  put(document, 0, false, text);
  return text + "\n";
}

}  // namespace ringwright::postprocess
