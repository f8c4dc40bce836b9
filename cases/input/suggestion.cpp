#include "cases/input/suggestion.hpp"

#include <fmt/format.h>
#include <fmt/ranges.h>

#include <algorithm>
#include <cctype>
#include <vector>

namespace ringwright::cases {
namespace {

// Optimal string alignment distance by the usual three rows of the dynamic programme.
std::size_t distance(const std::string& a, const std::string& b) {
  std::vector<std::size_t> before(b.size() + 1), above(b.size() + 1), row(b.size() + 1);
  for (std::size_t j = 0; j <= b.size(); ++j) above[j] = j;
  for (std::size_t i = 1; i <= a.size(); ++i) {
    row[0] = i;
    for (std::size_t j = 1; j <= b.size(); ++j) {
      const std::size_t change = above[j - 1] + (a[i - 1] == b[j - 1] ? 0 : 1);
      row[j] = std::min({above[j] + 1, row[j - 1] + 1, change});
      if (i > 1 && j > 1 && a[i - 1] == b[j - 2] && a[i - 2] == b[j - 1]) {
        row[j] = std::min(row[j], before[j - 2] + 1);
      }
    }
    before.swap(above);
    above.swap(row);
  }
  return above[b.size()];
}

}  // namespace

std::string normalised(std::string_view text) {
  std::string result;
  for (const char c : text) {
    const bool blank = c == ' ' || c == '-' || c == '_';
    if (!blank) {
      result += static_cast<char>(std::tolower(static_cast<unsigned char>(c)));
    } else if (!result.empty() && result.back() != ' ') {
      result += ' ';
    }
  }
  if (!result.empty() && result.back() == ' ') result.pop_back();
  return result;
}

std::optional<std::string> nearest(std::string_view word, std::span<const std::string> candidates) {
  if (word.size() > 64) return std::nullopt;
  const std::string given = normalised(word);
  std::optional<std::string> best;
  std::size_t least = 0;
  for (const std::string& candidate : candidates) {
    const std::size_t edits = distance(given, normalised(candidate));
    if (!best || edits < least) {
      best = candidate;
      least = edits;
    }
  }
  const std::size_t longest = std::max(given.size(), best ? best->size() : 0);
  if (best && least > std::max<std::size_t>(1, longest / 3)) return std::nullopt;
  return best;
}

std::string suggest(std::string_view word, std::span<const std::string> candidates) {
  if (const auto near = nearest(word, candidates)) return fmt::format("did you mean '{}'?", *near);
  return fmt::format("allowed: {}", fmt::join(candidates, ", "));
}

}  // namespace ringwright::cases
