#include "cases/input/text_traps.hpp"

#include <fmt/format.h>

namespace ringwright::cases {
namespace {

// Far beyond any case file. Without them the YAML library says no more than "bad file" of a text
// nested too deep, and work that grows with the square of a line or a map would be felt.
constexpr std::size_t longest_text = 1u << 16;
constexpr std::size_t longest_line = 2000;
constexpr int deepest_brackets = 16;

// Length of the UTF-8 sequence at the start of `text`, 0 if it is none (overlong forms, which
// only hide other characters, are caught for two and three bytes by the first byte's value).
std::size_t sequence_length(std::string_view text) {
  const auto first = static_cast<unsigned char>(text[0]);
  std::size_t length = 0;
  if (first < 0x80) return 1;
  if (first >= 0xC2 && first < 0xE0) length = 2;
  if (first >= 0xE0 && first < 0xF0) length = 3;
  if (first >= 0xF0 && first < 0xF5) length = 4;
  if (text.size() < length) return 0;
  for (std::size_t i = 1; i < length; ++i) {
    if ((static_cast<unsigned char>(text[i]) & 0xC0) != 0x80) return 0;
  }
  return length;
}

bool starts_comment(std::string_view line, std::size_t i) {
  return line[i] == '#' && (i == 0 || line[i - 1] == ' ' || line[i - 1] == '\t');
}

// Brackets open after each line; those in quotes are counted too, which does no harm.
class BracketDepth {
 public:
  /// @return the line takes it too deep for the first time
  bool add(std::string_view line) {
    const bool was_too_deep = depth_ > deepest_brackets;
    for (std::size_t i = 0; i < line.size() && !starts_comment(line, i); ++i) {
      if (line[i] == '[' || line[i] == '{') ++depth_;
      if (line[i] == ']' || line[i] == '}') --depth_;
      if (depth_ > deepest_brackets) break;
    }
    return depth_ > deepest_brackets && !was_too_deep;
  }

 private:
  int depth_ = 0;
};

// One problem per line is enough; the place is counted only then, lines may be long.
void look_at_line(std::string_view line, int number, std::vector<Diagnostic>& problems) {
  const auto place = [&](std::size_t i) { return Place{number, characters_in(line, i) + 1, 1}; };
  bool comment = false;
  for (std::size_t i = 0; i < line.size();) {
    comment = comment || starts_comment(line, i);
    const std::size_t length = sequence_length(line.substr(i));
    const auto byte = static_cast<unsigned char>(line[i]);
    if (length == 0) {
      problems.push_back({place(i),
                          fmt::format("byte 0x{:02x} is not UTF-8 text", byte),
                          "save the file as UTF-8",
                          {},
                          ""});
      return;
    }
    if (byte == '\t' && !comment) {
      problems.push_back(
          {place(i), "a tab; YAML aligns by blanks only", "put blanks in its place", {}, ""});
      return;
    }
    const bool line_end = byte == '\r' && i + 1 == line.size();
    if ((byte < 0x20 && byte != '\t' && !line_end) || byte == 0x7f) {
      problems.push_back(
          {place(i), fmt::format("control character 0x{:02x}", byte), "delete it", {}, ""});
      return;
    }
    i += length;
  }
}

}  // namespace

int characters_in(std::string_view text, std::size_t bytes) {
  int count = 0;
  for (std::size_t i = 0; i < bytes && i < text.size(); ++i) {
    if ((static_cast<unsigned char>(text[i]) & 0xC0) != 0x80) ++count;
  }
  return count;
}

void find_text_traps(std::string_view text, std::vector<Diagnostic>& problems) {
  if (text.size() > longest_text) {
    problems.push_back({Place{}, "the text is longer than 64 KiB: not a case file", "", {}, ""});
    return;
  }
  BracketDepth brackets;
  for (int number = 1;; ++number) {
    const std::size_t end = text.find('\n');
    const std::string_view line = text.substr(0, end);
    if (line.size() > longest_line || brackets.add(line)) {
      problems.push_back({Place{number, 1, 1},
                          "a line too long, or brackets nested too deep, for a case file",
                          "",
                          {},
                          ""});
    } else {
      look_at_line(line, number, problems);
    }
    if (end == std::string_view::npos) return;
    text.remove_prefix(end + 1);
  }
}

}  // namespace ringwright::cases
