#pragma once
#include <string>

#include "postprocess/reading/answer.hpp"

namespace ringwright::cases {

/// What each stop rule would do: when, at what rate, how far above steady, with how much water.
/// Empty for fewer than two rules, whose verdict the rest of the screen tells.
std::string verdict_table(const postprocess::Answer& answer);

/// A rule in words: "3 readings within 5 %", or the name of the preset.
std::string rule_words(const models::StopRule& rule);

}  // namespace ringwright::cases
