#include "cases/input/phrase_parts.hpp"

#include <fmt/format.h>

#include <cctype>
#include <cmath>

namespace ringwright::cases {

std::optional<double> part(const SectionReader& section, std::string_view key,
                           std::string_view text, Dimension dimension, const Range& range,
                           Reading& reading) {
  try {
    const double value = reading.units.read(text, dimension);
    if (value >= range.least && value <= range.most) return value;
    section.problem(key, fmt::format("{} is out of range", trimmed(text)),
                    "allowed: " + range.words);
  } catch (const ValueError& error) {
    section.problem(key, error.what(), error.hint());
  }
  return std::nullopt;
}

std::vector<std::string_view> split(std::string_view text, std::string_view at) {
  std::vector<std::string_view> parts;
  for (std::size_t end = text.find(at); end != std::string_view::npos; end = text.find(at)) {
    parts.push_back(trimmed(text.substr(0, end)));
    text.remove_prefix(end + at.size());
  }
  parts.push_back(trimmed(text));
  return parts;
}

bool take_front(std::string_view& text, std::string_view word) {
  if (!text.starts_with(word)) return false;
  text = trimmed(text.substr(word.size()));
  return true;
}

bool take_back(std::string_view& text, std::string_view word) {
  if (!text.ends_with(word)) return false;
  text = trimmed(text.substr(0, text.size() - word.size()));
  return true;
}

bool starts_with_digit(std::string_view text) {
  return !text.empty() && (std::isdigit(static_cast<unsigned char>(text[0])) || text[0] == '.');
}

std::optional<int> count_part(const SectionReader& section, std::string_view key,
                              std::string_view text, const Range& range, Reading& reading) {
  const auto count = part(section, key, text, Dimension::fraction, range, reading);
  if (!count) return std::nullopt;
  if (*count == std::floor(*count)) return static_cast<int>(*count);
  section.problem(key, fmt::format("{}: a whole number is needed", trimmed(text)));
  return std::nullopt;
}

}  // namespace ringwright::cases
