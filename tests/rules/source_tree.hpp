#pragma once
/// The C++ files of the repository as the rules see them: their includes and their size.

#include <filesystem>
#include <map>
#include <string>
#include <string_view>
#include <vector>

namespace ringwright::rules {

struct Include {
  int line = 0;        ///< from 1
  std::string target;  ///< between the quotes or brackets
  bool angled = false;
};

struct SourceFile {
  int lines = 0;
  bool pragma_once = false;
  std::vector<Include> includes;
};

/// Files by their path from the root, with forward slashes.
using SourceTree = std::map<std::string, SourceFile>;

struct Violation {
  std::string file;
  int line = 0;  ///< 0: the file as a whole
  std::string message;
};

/// Reads what the rules need from the text of one file.
SourceFile parse_source(std::string_view text);

/// All .hpp and .cpp files of the floors, the tests and the validation below root.
SourceTree read_tree(const std::filesystem::path& root);

/// First part of a path: "models" for "models/soil/curves.hpp", "" when there is none.
std::string floor_of(std::string_view path);

/// One line per violation, "file:line: message"; empty when there is none.
std::string listing(const std::vector<Violation>& violations);

}  // namespace ringwright::rules
