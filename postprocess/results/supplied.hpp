#pragma once
#include "postprocess/reading/answer.hpp"

namespace ringwright::postprocess {

/// What the supply of the (inner) ring gave from the start until a reading [m3]. Where no program
/// moves the water of the ring that is what the soil took and the pond.
double supplied_until(const Answer& answer, const models::Reading& reading);

}  // namespace ringwright::postprocess
