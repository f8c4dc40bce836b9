#pragma once
#include <nlohmann/json.hpp>

#include "postprocess/reading/answer.hpp"

namespace ringwright::postprocess {

/// Adds what stages, pairs of heads, the water of the rings, stop rules, flags and events come to.
void add_protocol(nlohmann::json& all, const Answer& answer);

}  // namespace ringwright::postprocess
