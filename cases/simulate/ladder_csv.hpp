#pragma once
#include <string>

#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {

/// All stop ladders as one table for a spreadsheet: a header line with the unit at the end of each
/// name, then a line per test, reading of the soil and time; the steady state has the time "never".
/// Twelve digits; rates at test temperature.
std::string ladder_csv(const Simulation& simulation);

}  // namespace ringwright::cases
