#pragma once
#include "postprocess/reading/answer.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/test_plan.hpp"
#include "postprocess/reading/worst_figure.hpp"

namespace ringwright::postprocess {

/// Reads a complete set of runs as a crew would: record, stop, ladder or stages, pairs, verdicts,
/// water, annulus, wetted ground. Everything else in the answer is left as it is.
/// @return the least accurate of the promised figures
WorstFigure read_runs(const TestPlan& plan, const CompanionRuns& runs, Answer& answer);

/// Time of the last reading [s]; 0 where a test ended before its first.
double stop_time(const Answer& answer);

}  // namespace ringwright::postprocess
