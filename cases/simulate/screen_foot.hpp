#pragma once
#include <string>

#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {

/// What was wetted, when the flow is steady, what the supply must give.
std::string stop_details(const postprocess::Answer& answer);

/// The ground as run, for each reading of the soil, and every default.
std::string assumed_block(const Case& what, const AnsweredTest& answered);

/// Doubt about soil and site first, numerical error and water balance last.
std::string doubt_lines(const Case& what, const AnsweredTest& answered);

}  // namespace ringwright::cases
