#pragma once
#include <string>

#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {

/// The headline of a test whose head is not one constant: by the two-head formula where heads are
/// paired, by the rate of the last reading otherwise; from the first reading of the soil, with the
/// figures of each other one beside it.
std::string staged_headline(const Case& what, const AnsweredTest& answered);

}  // namespace ringwright::cases
