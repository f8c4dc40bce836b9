#include "cases/simulate/paragraph.hpp"

namespace ringwright::cases {
namespace {

// Text in characters, not bytes: continuation bytes of UTF-8 take no room.
std::size_t width_of(std::string_view text) {
  std::size_t width = 0;
  for (const char c : text) width += (static_cast<unsigned char>(c) & 0xC0U) != 0x80U;
  return width;
}

}  // namespace

std::string paragraph(std::string_view text, std::string_view first, std::string_view rest) {
  std::string result;
  std::string line(first);
  bool empty = true;
  while (!text.empty()) {
    const std::size_t end = std::min(text.find(' '), text.size());
    const std::string_view word = text.substr(0, end);
    text.remove_prefix(std::min(end + 1, text.size()));
    if (word.empty()) continue;
    if (!empty && width_of(line) + 1 + width_of(word) > screen_width) {
      result += line + "\n";
      line = rest;
      empty = true;
    }
    if (!empty) line += ' ';
    line += word;
    empty = false;
  }
  return empty ? result : result + line + "\n";
}

}  // namespace ringwright::cases
