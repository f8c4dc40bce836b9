#pragma once
#include <string>

#include "postprocess/reading/answer.hpp"

namespace ringwright::cases {

/// Where the water of each ring goes until the stop: soil, pond, losses, and their sum, which is to
/// be brought. Empty for a plain constant head in one ring, where nothing is lost.
std::string water_table(const postprocess::Answer& answer);

}  // namespace ringwright::cases
