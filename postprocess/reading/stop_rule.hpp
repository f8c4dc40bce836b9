#pragma once
#include <cstddef>
#include <optional>
#include <span>

#include "models/protocol/stop_rule.hpp"
#include "models/record/record.hpp"

namespace ringwright::postprocess {

/// First reading at which the last `readings` rates all lie within `within` of their mean: the
/// index of that reading, or none. Judged on the record as the crew has it, reading by reading.
std::optional<std::size_t> first_steady_reading(const models::Record& record, int readings,
                                                double within);

/// First reading at which a stop rule of any kind is met: the index of that reading, or none. The
/// record is the one as read, without the readings of a soak; time and volume count from the start
/// of its first reading. Rates are compared within one stage only, never across a change of head;
/// after a change the rule starts again with the first reading of the new stage.
/// @param stage_starts times at which a stage begins [s], ascending; empty: one stage
/// @throws std::invalid_argument for a rule of fewer than one reading, or a time, volume, share or
///   amount below 0 that the rule needs
/// @checked tests/postprocess/reading/stop_rule_test.cpp
std::optional<std::size_t> first_stop(const models::Record& record, const models::StopRule& rule,
                                      std::span<const double> stage_starts = {});

}  // namespace ringwright::postprocess
