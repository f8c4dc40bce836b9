#pragma once
#include <string>
#include <string_view>

namespace ringwright::cases {

/// A field that spreadsheets take as it stands.
inline std::string csv_field(std::string_view text) {
  std::string result = "\"";
  for (const char c : text) result += c == '"' ? std::string("\"\"") : std::string(1, c);
  return result + "\"";
}

}  // namespace ringwright::cases
