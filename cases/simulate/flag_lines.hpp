#pragma once
#include <string>

#include "postprocess/reading/answer.hpp"

namespace ringwright::cases {

/// A paragraph per flag: "! what, with its number and limit; cure". What can hurt people or a liner
/// first, and then who decides about it. Empty without flags.
std::string flag_lines(const postprocess::Answer& answer);

/// "NOT FOR USE ..." for a lidded test that lacks relief or rating; empty otherwise. Stands at the
/// top of the screen.
std::string not_for_use(const postprocess::Answer& answer);

}  // namespace ringwright::cases
