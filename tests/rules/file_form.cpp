#include "tests/rules/file_form.hpp"

#include <string>

namespace ringwright::rules {

std::vector<Violation> misshapen_files(const SourceTree& tree) {
  constexpr int longest = 400;
  std::vector<Violation> found;
  for (const auto& [path, file] : tree) {
    if (path.ends_with(".hpp") && !file.pragma_once) {
      found.push_back({path, 0, "header without #pragma once"});
    }
    if (file.lines > longest) {
      found.push_back({path, file.lines, "longer than " + std::to_string(longest) + " lines"});
    }
  }
  return found;
}

}  // namespace ringwright::rules
