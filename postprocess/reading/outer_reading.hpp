#pragma once
#include "postprocess/reading/answer.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/test_plan.hpp"
#include "postprocess/reading/worst_figure.hpp"

namespace ringwright::postprocess {

/// The annulus of a double ring at the stop. Promised: both rates.
/// @param last the reading that ends at the stop
OuterReading outer_reading(const Question& question, const TestPlan& plan,
                           const CompanionRuns& runs, const PlannedReading& last,
                           WorstFigure& worst);

}  // namespace ringwright::postprocess
