#include "cases/input/unit_aliases.hpp"

#include <fmt/format.h>

#include <array>
#include <cctype>
#include <utility>

#include "cases/input/number.hpp"

namespace ringwright::cases {
namespace {

bool is_letter(char c) {
  // Bytes from 0x80 belong to letters and signs such as the micro and degree signs.
  return std::isalpha(static_cast<unsigned char>(c)) || c == '_' || c == '%' ||
         static_cast<unsigned char>(c) >= 0x80;
}

bool is_digit(char c) { return c >= '0' && c <= '9'; }

void replace_all(std::string& text, std::string_view from, std::string_view to) {
  for (std::size_t at = text.find(from); at != std::string::npos;
       at = text.find(from, at + to.size())) {
    text.replace(at, from.size(), to);
  }
}

// The library rounds its gallon; 231 cubic inches are exact.
std::string_view alias_of(std::string_view word) {
  constexpr std::array<std::pair<std::string_view, std::string_view>, 31> table{{
      {"gal", "(231 inch^3)"},
      {"gals", "(231 inch^3)"},
      {"gallon", "(231 inch^3)"},
      {"gallons", "(231 inch^3)"},
      {"gpm", "(231 inch^3/min)"},
      {"gph", "(231 inch^3/hour)"},
      {"gpd", "(231 inch^3/day)"},
      {"lpm", "(liter/min)"},
      {"litres", "liter"},
      {"litre", "liter"},
      {"ml", "mL"},
      {"hrs", "hour"},
      {"mins", "min"},
      {"sec", "s"},
      {"secs", "s"},
      {"days", "day"},
      {"ins", "inch"},
      {"psi", "psi"},
      {"mH2O", "(m H2O)"},
      {"percent", "%"},
      {"\u00B0C", "degC"},
      {"\u00B0F", "degF"},
      {"\u2103", "degC"},
      {"\u2109", "degF"},
      {"celsius", "degC"},
      {"Celsius", "degC"},
      {"fahrenheit", "degF"},
      {"Fahrenheit", "degF"},
      {"hours", "hour"},
      {"h", "hour"},
      {"hr", "hour"},
  }};
  for (const auto& [alias, unit] : table) {
    if (alias == word) return unit;
  }
  return word;
}

void refuse_misleading(std::string_view word) {
  if (word == "C" || word == "F") {
    throw ValueError(fmt::format("{} alone is the {}, not a temperature", word,
                                 word == "C" ? "coulomb" : "farad"),
                     fmt::format("write deg{}", word));
  }
  if (word == "pF") {
    throw ValueError("pF is a logarithm, not a unit", "write the suction itself: pF 2.5 is 316 cm");
  }
}

// Signs that stand for words, and blanks that a unit does not need.
std::string spelled_out(std::string_view unit) {
  std::string text(unit);
  for (const std::string_view sign : {"\"", "\u2033", "\u201D", "''"})
    replace_all(text, sign, " inch");
  for (const std::string_view sign : {"'", "\u2032", "\u2019"}) replace_all(text, sign, " foot");
  replace_all(text, "\u00B0 ", "\u00B0");
  replace_all(text, "deg C", "degC");
  replace_all(text, "deg F", "degF");
  if (text.starts_with("per ")) text = "1/" + text.substr(4);
  replace_all(text, " per ", "/");
  return text;
}

// A digit may only be an exponent (right after a letter, '^' or '-') or the 1 of "1/cm".
void refuse_numbers(std::string_view unit, std::string_view text) {
  for (std::size_t i = 0; i < text.size(); ++i) {
    const char c = text[i];
    const bool known = is_letter(c) || is_digit(c) ||
                       std::string_view(" /*.^-()").find(c) != std::string_view::npos;
    if (!known) {
      throw ValueError(fmt::format("'{}' is not a unit: '{}' does not belong", unit, c));
    }
    if (!is_digit(c)) continue;
    const char before = i == 0 ? ' ' : text[i - 1];
    const bool exponent = is_letter(before) || before == '^' || before == '-';
    const bool one_over =
        c == '1' && i == 0 && text.size() > 1 && (text[1] == '/' || text[1] == ' ');
    if (!exponent && !one_over) {
      throw ValueError(fmt::format("a number inside the unit '{}'", unit),
                       "write one number and one unit, such as 12.5 in");
    }
  }
}

}  // namespace

std::string without_aliases(std::string_view unit) {
  const std::string text = spelled_out(unit);
  refuse_numbers(unit, text);
  std::string result;
  for (std::size_t i = 0; i < text.size();) {
    std::size_t end = i;
    while (end < text.size() && is_letter(text[end])) ++end;
    if (end == i) {
      result += text[i++];
      continue;
    }
    const std::string_view word = std::string_view(text).substr(i, end - i);
    refuse_misleading(word);
    result += alias_of(word);
    i = end;
  }
  return std::string(trimmed(result));
}

std::vector<std::string> usual_units() {
  return {"mm",   "cm",   "m",   "in",   "ft",   "s",     "min",    "h",   "d",   "mm/h", "cm/h",
          "cm/d", "in/h", "m/s", "ft/d", "degC", "degF",  "1/cm",   "1/m", "kPa", "hPa",  "bar",
          "psi",  "L",    "mL",  "gal",  "m3",   "L/min", "mL/min", "gpm", "%"};
}

}  // namespace ringwright::cases
