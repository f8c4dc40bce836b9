#pragma once
/// "Did you mean ...": the nearest of the words that would have been right.

#include <optional>
#include <span>
#include <string>
#include <string_view>

namespace ringwright::cases {

/// Lower case, blanks at the ends removed, runs of blanks, '-' and '_' made one blank.
std::string normalised(std::string_view text);

/// The candidate nearest to `word` by edits (insert, delete, change, swap neighbours), case and
/// blanks apart; none if even that is further than a third of its length (at least 1).
std::optional<std::string> nearest(std::string_view word, std::span<const std::string> candidates);

/// "did you mean 'x'?" or, if nothing is near, "allowed: a, b, c".
std::string suggest(std::string_view word, std::span<const std::string> candidates);

}  // namespace ringwright::cases
