#pragma once
#include <string>

#include "postprocess/reading/answer.hpp"

namespace ringwright::cases {

/// "Formula outside its published range ...", with every quantity that is; empty when none is.
/// One paragraph of the first screen.
std::string formula_range(const postprocess::Answer& answer);

}  // namespace ringwright::cases
