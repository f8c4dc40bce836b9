#pragma once
/// Neighbouring stages at different constant heads, read together by the two-ponding-depth formula.
///
/// Promised: every pair's Kfs. The error counts against the Kfs itself, but not against less than
/// the true one: a pair whose rates hardly differ yields a Kfs near 0 or below, which is of no use
/// and cannot be relatively exact.

#include <vector>

#include "postprocess/reading/answer.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/test_plan.hpp"
#include "postprocess/reading/worst_figure.hpp"

namespace ringwright::postprocess {

/// @param stages of stage_readings(), which the pairs refer to; the rest as there
std::vector<HeadPair> head_pairs(const Question& question, const TestPlan& plan,
                                 const CompanionRuns& runs, const models::Record& as_read,
                                 const std::vector<StageReading>& stages, double stop,
                                 WorstFigure& worst);

}  // namespace ringwright::postprocess
