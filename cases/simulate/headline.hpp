#pragma once
#include <string>

#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {

/// The answer in a few sentences: when to stop, what to bring, what the form will say, what is
/// true, and the factors between the two; from the first reading of the soil, with the figures of
/// each other one beside it.
std::string headline(const Case& what, const AnsweredTest& answered);

}  // namespace ringwright::cases
