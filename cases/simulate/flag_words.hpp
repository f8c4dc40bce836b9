#pragma once
#include <string>

#include "postprocess/reading/answer.hpp"

namespace ringwright::cases {

/// What a flag says, and the cure, in the words of the trade.
std::string flag_words(const postprocess::Flag& flag, const postprocess::Answer& answer);

}  // namespace ringwright::cases
