/// Every example with every value spoilt in many ways: the reader answers with a case or with
/// CaseErrors that point into the text, never with anything else.

#include <algorithm>
#include <array>
#include <catch2/catch.hpp>
#include <filesystem>
#include <fstream>
#include <string>
#include <vector>

#include "cases/input/read_case.hpp"

namespace ringwright::cases {
namespace {

using Lines = std::vector<std::string>;

Lines lines_of(const std::filesystem::path& path) {
  std::ifstream file(path);
  Lines lines;
  for (std::string line; std::getline(file, line);) lines.push_back(line);
  return lines;
}

std::string joined(const Lines& lines) {
  std::string text;
  for (const std::string& line : lines) text += line + "\n";
  return text;
}

// @return it was read
bool answers(const std::string& text, int lines) {
  try {
    const Case result = read_case(text, "spoilt.yaml");
    CHECK_FALSE(result.tests.empty());
    CHECK_FALSE(result.ground.variants.empty());
    return true;
  } catch (const CaseErrors& errors) {
    CHECK_FALSE(errors.diagnostics().empty());
    for (const Diagnostic& diagnostic : errors.diagnostics()) {
      CHECK_FALSE(diagnostic.message.empty());
      CHECK((diagnostic.place.line >= 1 && diagnostic.place.line <= lines + 1));
    }
    return false;
  }
}

const std::array spoilt{"",         "x",       "[]",          "{}",           "[1, 2]",
                        "{ a: b }", "0",       "0 cm",        "-5 cm",        "1e30 m",
                        "5 cm",     "3 m",     "20 min",      "from 3 m to",  " then ",
                        ", , ,",    "1 times", "hydrostatic", "a for b to c", "100 kPa"};

struct Count {
  int texts = 0, read = 0;
};

void spoil_values(const Lines& lines, Count& count) {
  for (std::size_t i = 0; i < lines.size(); ++i) {
    const std::size_t colon = lines[i].find(": ");
    for (const char* value : spoilt) {
      Lines changed = lines;
      if (colon == std::string::npos) continue;
      changed[i] = lines[i].substr(0, colon + 2) + value;
      INFO(changed[i]);
      ++count.texts;
      if (answers(joined(changed), static_cast<int>(lines.size()))) ++count.read;
    }
  }
}

// Lines left out, and lines put elsewhere, where their keys mean something else.
void spoil_lines(const Lines& lines, Count& count) {
  for (std::size_t i = 0; i < lines.size(); ++i) {
    Lines without = lines;
    without.erase(without.begin() + static_cast<std::ptrdiff_t>(i));
    INFO("line " << i + 1);
    ++count.texts;
    if (answers(joined(without), static_cast<int>(lines.size()))) ++count.read;
    for (std::size_t at = 0; at < without.size(); ++at) {
      Lines moved = without;
      moved.insert(moved.begin() + static_cast<std::ptrdiff_t>(at), lines[i]);
      ++count.texts;
      if (answers(joined(moved), static_cast<int>(lines.size()))) ++count.read;
    }
  }
}

}  // namespace

TEST_CASE("no spoilt example gets more than an answer out of the reader", "[slow]") {
  const auto folder = std::filesystem::path(RINGWRIGHT_SOURCE_DIR) / "cases/examples";
  Count count;
  int examples = 0;
  for (const auto& entry : std::filesystem::directory_iterator(folder)) {
    if (entry.path().extension() != ".yaml") continue;
    INFO(entry.path().filename().string());
    const Lines lines = lines_of(entry.path());
    REQUIRE(answers(joined(lines), static_cast<int>(lines.size())));
    spoil_values(lines, count);
    spoil_lines(lines, count);
    ++examples;
  }
  CHECK(examples >= 5);
  // Some changes are harmless, most are not.
  CHECK(count.read > 0);
  CHECK(count.read < count.texts / 2);
}

}  // namespace ringwright::cases
