/// Every wrong case file here is refused with exactly the message in the .expected file beside
/// it. The first line of a case names its kind of error. The expected texts were read and
/// judged by hand: a change of wording is a change of what users read.

#include <algorithm>
#include <catch2/catch.hpp>
#include <filesystem>
#include <fstream>
#include <set>
#include <sstream>
#include <string>
#include <vector>

#include "cases/input/read_case.hpp"

namespace ringwright::cases {
namespace {

const std::filesystem::path folder =
    std::filesystem::path(RINGWRIGHT_SOURCE_DIR) / "tests/bad_cases";

std::string text_of(const std::filesystem::path& path) {
  std::ifstream file(path, std::ios::binary);
  std::stringstream text;
  text << file.rdbuf();
  return text.str();
}

std::vector<std::filesystem::path> bad_cases() {
  std::vector<std::filesystem::path> paths;
  for (const auto& entry : std::filesystem::directory_iterator(folder)) {
    if (entry.path().extension() == ".yaml") paths.push_back(entry.path());
  }
  std::sort(paths.begin(), paths.end());
  return paths;
}

std::string kind_of(const std::string& text) {
  const std::string mark = "# kind: ";
  if (!text.starts_with(mark)) return "";
  return text.substr(mark.size(), text.find('\n') - mark.size());
}

std::string message_of(const std::filesystem::path& path) {
  try {
    read_case(text_of(path), path.filename());
  } catch (const CaseErrors& errors) {
    return errors.what();
  }
  return "read without errors";
}

}  // namespace

TEST_CASE("wrong case files are refused with the message expected") {
  for (const auto& path : bad_cases()) {
    INFO(path.filename().string());
    auto expected = path;
    expected.replace_extension(".expected");
    CHECK(message_of(path) == text_of(expected));
  }
}

TEST_CASE("there are at least 40 wrong case files of at least 15 kinds") {
  std::set<std::string> kinds;
  for (const auto& path : bad_cases()) {
    const std::string kind = kind_of(text_of(path));
    INFO(path.filename().string());
    CHECK_FALSE(kind.empty());
    kinds.insert(kind);
  }
  CHECK(bad_cases().size() >= 40);
  CHECK(kinds.size() >= 15);
}

}  // namespace ringwright::cases
