#pragma once
#include <string_view>

namespace ringwright::cases {

/// Version of this program, as in the build description (a test keeps the two equal).
inline constexpr std::string_view program_version = "0.1.0";

}  // namespace ringwright::cases
