#pragma once
#include <string>

#include "postprocess/reading/answer.hpp"

namespace ringwright::cases {

/// What the form would say against when one stops: a row per time, the stop marked, the last row
/// for a test that never ends.
std::string ladder_table(const postprocess::Answer& answer);

/// The stop as the form's figures: rate and Kfs by each reading of it beside the true one, at test
/// temperature and at 20 degC. Empty when the stop was not reached.
/// @param temperature of the water in the test [degC]
std::string reading_table(const postprocess::Answer& answer, double temperature);

}  // namespace ringwright::cases
