#pragma once
/// A soil by its hydraulic parameters: the block `parameters:`.

#include <vector>

#include "cases/input/case.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// The one soil described; empty if something was reported.
std::vector<SoilVariant> read_parameters(const SectionReader& ground, Reading& reading);

}  // namespace ringwright::cases
