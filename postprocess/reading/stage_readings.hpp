#pragma once
/// The stages of a test as read at their ends.
///
/// Promised: the rate and the volume of every stage that is read, from 5 % of the time of the stop
/// for volumes; rates at every stage end; the steady rates.

#include <optional>
#include <vector>

#include "postprocess/reading/answer.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/test_plan.hpp"
#include "postprocess/reading/worst_figure.hpp"

namespace ringwright::postprocess {

/// The last reading of a stage up to the stop: its index in plan and record; none: not read.
std::optional<std::size_t> last_reading_of(const TestPlan& plan, std::size_t stage, double stop);

/// @param as_read from record_as_read() @param stop time of a reading, in all the runs [s]
std::vector<StageReading> stage_readings(const Question& question, const TestPlan& plan,
                                         const CompanionRuns& runs, const models::Record& as_read,
                                         double stop, WorstFigure& worst);

}  // namespace ringwright::postprocess
