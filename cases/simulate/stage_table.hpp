#pragma once
#include <string>

#include "postprocess/reading/answer.hpp"

namespace ringwright::cases {

/// A row per stage: from, to, head, rate at its end, litres into the soil, how far above steady,
/// and the rate as the crew reads it. Empty without stages.
std::string stage_table(const postprocess::Answer& answer);

/// Each pair of heads read together: Kfs at both temperatures, reads x, and as the crew reads it;
/// the true Kfs last. Empty without pairs.
/// @param temperature of the water in the test [degC]
std::string pair_table(const postprocess::Answer& answer, double temperature);

/// Level and rate against time, at most eight rows of the record, where the head is not held;
/// empty otherwise.
std::string level_table(const postprocess::Answer& answer);

}  // namespace ringwright::cases
