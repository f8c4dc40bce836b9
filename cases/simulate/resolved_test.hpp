#pragma once
#include <nlohmann/json.hpp>
#include <string_view>

#include "cases/input/case_test.hpp"

namespace ringwright::cases {

/// {"value", "unit"}
nlohmann::json with_unit(double value, std::string_view unit);

/// One test with every value in SI.
nlohmann::json resolved_test(const Test& test);

}  // namespace ringwright::cases
