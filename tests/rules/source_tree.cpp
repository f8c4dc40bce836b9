#include "tests/rules/source_tree.hpp"

#include <algorithm>
#include <array>
#include <fstream>
#include <iterator>
#include <regex>
#include <sstream>

namespace ringwright::rules {

SourceFile parse_source(std::string_view text) {
  static const std::regex include_line(R"re(^\s*#\s*include\s*(["<])([^">]+)[">].*)re");
  static const std::regex pragma_line(R"re(^\s*#\s*pragma\s+once\s*)re");
  SourceFile file;
  std::istringstream stream{std::string(text)};
  std::string line;
  while (std::getline(stream, line)) {
    ++file.lines;
    std::smatch match;
    if (std::regex_match(line, match, include_line)) {
      file.includes.push_back({file.lines, match[2], match[1] == "<"});
    } else if (std::regex_match(line, pragma_line)) {
      file.pragma_once = true;
    }
  }
  return file;
}

SourceTree read_tree(const std::filesystem::path& root) {
  namespace fs = std::filesystem;
  constexpr std::array rooms = {"models", "solver", "postprocess", "cases", "tests", "validation"};
  SourceTree tree;
  for (const char* room : rooms) {
    for (const auto& entry : fs::recursive_directory_iterator(root / room)) {
      const auto extension = entry.path().extension();
      if (!entry.is_regular_file() || (extension != ".hpp" && extension != ".cpp")) continue;
      std::ifstream stream(entry.path());
      const std::string text(std::istreambuf_iterator<char>(stream), {});
      tree[entry.path().lexically_relative(root).generic_string()] = parse_source(text);
    }
  }
  return tree;
}

std::string floor_of(std::string_view path) {
  const auto slash = path.find('/');
  return slash == std::string_view::npos ? std::string{} : std::string(path.substr(0, slash));
}

std::string listing(const std::vector<Violation>& violations) {
  std::string text;
  for (const auto& [file, line, message] : violations) {
    text += file + (line > 0 ? ":" + std::to_string(line) : "") + ": " + message + "\n";
  }
  return text;
}

}  // namespace ringwright::rules
