#pragma once
/// From what the user wrote to what the solver is asked.

#include "cases/input/case.hpp"
#include "postprocess/reading/answer.hpp"

namespace ringwright::cases {

/// The question a test puts to one reading of the soil.
///
/// Conductivities of a case are at 20 degC, those of a run at test temperature T:
///   K(T) = K(20) mu(20) / mu(T),  mu the viscosity of water.
///
/// @param accuracy asked of every figure [-]
/// @param threads companion runs that may go side by side
/// @throws std::invalid_argument for a moisture the soil cannot have
/// @checked tests/cases/simulate/question_test.cpp
postprocess::Question question_of(const Test& test, const Ground& ground,
                                  const SoilVariant& variant, double accuracy, int threads);

}  // namespace ringwright::cases
