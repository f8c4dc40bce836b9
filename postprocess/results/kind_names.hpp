#pragma once
/// Names of kinds in the result files, and the units of the numbers that go with them.

#include "postprocess/reading/answer.hpp"

namespace ringwright::postprocess {

const char* kind_name(FlagKind kind);
const char* kind_name(models::StopKind kind);
const char* kind_name(solver::EventKind kind);

struct FlagUnits {
  const char* value;
  const char* limit;
  const char* place;
};

FlagUnits units_of(FlagKind kind);

/// Of the value of an event.
const char* unit_of(solver::EventKind kind);

}  // namespace ringwright::postprocess
