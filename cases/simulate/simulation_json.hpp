#pragma once
#include <nlohmann/json.hpp>

#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {

/// Everything computed, nothing rounded: the resolved case and, per test and reading of the soil,
/// the document that stands in answer.json.
nlohmann::json simulation_json(const Simulation& simulation);

}  // namespace ringwright::cases
