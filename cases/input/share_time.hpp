#pragma once
/// How long every stage lasts.

#include "cases/input/build_program.hpp"

namespace ringwright::cases {

/// Fills the durations that are open with equal parts of the time that is left, and
/// `protocol.longest` with the length of the whole test, soak included.
/// @return false if something was reported
bool share_time(const SectionReader& own, const TimeAllowed& allowed,
                std::vector<StageWords>& stages, Test& test, Reading& reading);

}  // namespace ringwright::cases
