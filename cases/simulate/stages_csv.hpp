#pragma once
#include <string>

#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {

/// The stages of all tests that have no ladder, as a table for spreadsheets, all digits: a row per
/// stage, with the pair of heads it ends (two-head formula) where there is one. A header alone
/// where no test has stages.
std::string stages_csv(const Simulation& simulation);

/// What --csv prints: the ladders, the stages, or both with an empty line between, as far as the
/// tests have them.
std::string tables_csv(const Simulation& simulation);

/// Whether any test is told by its stages.
bool has_stages(const Simulation& simulation);

}  // namespace ringwright::cases
