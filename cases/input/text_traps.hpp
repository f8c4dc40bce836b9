#pragma once
/// What is refused in a case text before YAML sees it.

#include <string_view>
#include <vector>

#include "cases/input/diagnostic.hpp"

namespace ringwright::cases {

/// Appends a problem per line with a tab outside a comment, for other control characters, for
/// bytes that are not UTF-8 and for a text, line or nesting beyond any case file.
void find_text_traps(std::string_view text, std::vector<Diagnostic>& problems);

/// Number of characters in the first `bytes` bytes of UTF-8 text.
int characters_in(std::string_view text, std::size_t bytes);

}  // namespace ringwright::cases
