#pragma once
#include <string>
#include <string_view>

namespace ringwright::cases {

/// Width of the first screen [characters].
inline constexpr std::size_t screen_width = 96;

/// The words of `text` in lines of at most `screen_width`, newline at the end. A number
/// stays with the word after it, its unit.
/// @param first before the first line; @param rest before the others
std::string paragraph(std::string_view text, std::string_view first, std::string_view rest);

}  // namespace ringwright::cases
