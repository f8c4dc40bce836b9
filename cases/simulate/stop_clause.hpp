#pragma once
#include <string>

#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {

/// "Stop at 3 h, bring 13 L.", or why the test ends otherwise; of a double ring the litres of each
/// ring as well. @param time of the stop [s]
std::string stop_clause(const postprocess::Answer& answer, double time);

}  // namespace ringwright::cases
