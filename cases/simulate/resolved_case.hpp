#pragma once
#include <nlohmann/json.hpp>

#include "cases/input/case.hpp"

namespace ringwright::cases {

/// The case with every value in SI and defaults filled in: values with a unit as
/// {"value", "unit"}, plain numbers as they are.
nlohmann::json resolved_case(const Case& what);

}  // namespace ringwright::cases
