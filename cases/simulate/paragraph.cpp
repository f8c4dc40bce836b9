#include "cases/simulate/paragraph.hpp"

#include <algorithm>

namespace ringwright::cases {
namespace {

// Text in characters, not bytes: continuation bytes of UTF-8 take no room.
std::size_t width_of(std::string_view text) {
  std::size_t width = 0;
  for (const char c : text) width += (static_cast<unsigned char>(c) & 0xC0U) != 0x80U;
  return width;
}

bool is_number(std::string_view word) {
  return !word.empty() && word.find_first_not_of("0123456789.+-") == std::string_view::npos;
}

// Takes the next word off the text; a number together with the word after it, its unit.
std::string take_word(std::string_view& text) {
  const auto take = [&text] {
    const std::size_t begin = std::min(text.find_first_not_of(' '), text.size());
    const std::size_t end = std::min(text.find(' ', begin), text.size());
    const std::string word(text.substr(begin, end - begin));
    text.remove_prefix(end);
    return word;
  };
  std::string word = take();
  if (!is_number(word)) return word;
  const std::string unit = take();
  return unit.empty() ? word : word + " " + unit;
}

}  // namespace

std::string paragraph(std::string_view text, std::string_view first, std::string_view rest) {
  std::string result;
  std::string line(first);
  bool empty = true;
  for (std::string word = take_word(text); !word.empty(); word = take_word(text)) {
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
