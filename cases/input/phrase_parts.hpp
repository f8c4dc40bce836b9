#pragma once
/// Pieces that the small grammars of phrases are made of.

#include <optional>
#include <string_view>
#include <vector>

#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// A quantity inside the phrase at `key` whose range the grammar of the key does not hold; none
/// if it was reported as wrong.
std::optional<double> part(const SectionReader& section, std::string_view key,
                           std::string_view text, Dimension dimension, const Range& range,
                           Reading& reading);

/// The same for a whole number.
std::optional<int> count_part(const SectionReader& section, std::string_view key,
                              std::string_view text, const Range& range, Reading& reading);

/// The pieces between the separators, blanks removed at their ends; at least one.
std::vector<std::string_view> split(std::string_view text, std::string_view at);

/// Takes a word off the front (or the end) with the blanks beside it. @return it was there
bool take_front(std::string_view& text, std::string_view word);
bool take_back(std::string_view& text, std::string_view word);

/// Begins like a number.
bool starts_with_digit(std::string_view text);

}  // namespace ringwright::cases
