#pragma once
/// The groups of `fields.h5` about how the test was done and read: the record as the crew has it,
/// stages, pairs of heads, stop rules, flags, events, the water of the rings.

#include "postprocess/reading/answer.hpp"
#include "postprocess/results/h5_handle.hpp"

namespace ringwright::postprocess {

/// /as_read, /stages, /pairs, /verdicts, /flags, /events, /water.
void write_protocol_groups(hid_t file, const Answer& answer);

}  // namespace ringwright::postprocess
