#include "cases/input/number.hpp"

#include <fmt/format.h>

#include <cctype>
#include <charconv>
#include <system_error>

namespace ringwright::cases {
namespace {

bool is_digit(char c) { return c >= '0' && c <= '9'; }

bool begins_with_word(std::string_view text, std::string_view word) {
  if (text.size() < word.size()) return false;
  for (std::size_t i = 0; i < word.size(); ++i) {
    if (std::tolower(static_cast<unsigned char>(text[i])) != word[i]) return false;
  }
  return text.size() == word.size() || !std::isalpha(static_cast<unsigned char>(text[word.size()]));
}

void refuse_not_finite(std::string_view text, std::string_view unsigned_text) {
  for (const std::string_view word : {".nan", ".inf", "nan", "inf", "infinity"}) {
    if (begins_with_word(unsigned_text, word)) {
      throw ValueError(fmt::format("'{}' is not a finite number", text));
    }
  }
}

std::string without_leading_zeros(std::string_view text) {
  while (text.size() > 1 && text[0] == '0' && is_digit(text[1])) text.remove_prefix(1);
  return std::string(text);
}

void refuse_other_bases(std::string_view text, std::string_view digits) {
  if (digits.size() < 2 || digits[0] != '0') return;
  if (is_digit(digits[1])) {
    throw ValueError(fmt::format("'{}' begins with 0 and looks octal", text),
                     fmt::format("write {}", without_leading_zeros(digits)));
  }
  if (digits[1] == 'x' || digits[1] == 'X' || digits[1] == 'o') {
    throw ValueError(fmt::format("'{}' is not a decimal number", text));
  }
}

void refuse_grouping(std::string_view text, std::string_view after) {
  if (after.size() < 2 || !is_digit(after[1])) return;
  if (after[0] == ',') {
    throw ValueError(fmt::format("'{}' has a comma inside the number", text),
                     "the decimal sign is a point, and thousands are not set apart");
  }
  if (after[0] == '_') {
    throw ValueError(fmt::format("'{}' has '_' inside the number", text), "leave it out");
  }
  if (after[0] == ':') {
    throw ValueError(fmt::format("'{}' looks like a time of day", text),
                     "write a duration with its unit, such as 90 min");
  }
  if (after[0] == '/') {
    throw ValueError(fmt::format("'{}' has a fraction", text),
                     "write it with a point, such as 0.5");
  }
}

}  // namespace

std::string_view trimmed(std::string_view text) {
  while (!text.empty() && text.front() == ' ') text.remove_prefix(1);
  while (!text.empty() && text.back() == ' ') text.remove_suffix(1);
  return text;
}

ScannedNumber scan_number(std::string_view whole) {
  const std::string_view text = trimmed(whole);
  std::string_view digits = text;
  const bool negative = !digits.empty() && digits[0] == '-';
  if (!digits.empty() && (digits[0] == '-' || digits[0] == '+')) digits.remove_prefix(1);
  refuse_not_finite(text, digits);
  const bool begins =
      !digits.empty() &&
      (is_digit(digits[0]) || (digits[0] == '.' && digits.size() > 1 && is_digit(digits[1])));
  if (!begins) throw ValueError(fmt::format("'{}' does not begin with a number", text));
  refuse_other_bases(text, digits);
  double value = 0.0;
  const auto [end, error] = std::from_chars(digits.data(), digits.data() + digits.size(), value);
  if (error != std::errc{})
    throw ValueError(fmt::format("'{}' is beyond any number of use here", text));
  const std::string_view after = digits.substr(static_cast<std::size_t>(end - digits.data()));
  refuse_grouping(text, after);
  return {negative ? -value : value, trimmed(after)};
}

double read_number(std::string_view text) {
  const ScannedNumber number = scan_number(text);
  if (!number.rest.empty()) {
    throw ValueError(fmt::format("'{}' is not a plain number", trimmed(text)),
                     fmt::format("'{}' is too much: this value has no unit", number.rest));
  }
  return number.value;
}

}  // namespace ringwright::cases
