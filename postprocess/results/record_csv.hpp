#pragma once
#include <string>

#include "postprocess/reading/answer.hpp"

namespace ringwright::postprocess {

/// The record as a table for a spreadsheet: one header line with the unit at the end of each name,
/// then one line per reading; comma, point and newline everywhere. Rates are at test temperature.
/// Columns: time_h, interval_s, volume_mL, total_volume_L (into the soil), supply_L (with the
/// pond), rate_mm_per_h, head_cm. Twelve digits: far more than the numerical error, and none that
/// come from the change of unit.
std::string record_csv(const Answer& answer);

}  // namespace ringwright::postprocess
