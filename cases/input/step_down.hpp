#pragma once
/// The key `step down`.

#include <optional>

#include "cases/input/section_reader.hpp"
#include "models/protocol/stage.hpp"

namespace ringwright::cases {

std::optional<models::StepDown> read_step_down(const SectionReader& section);

}  // namespace ringwright::cases
