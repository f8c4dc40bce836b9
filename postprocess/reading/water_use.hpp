#pragma once
/// Where the water of each ring went until the stop, and what the supply gave at most.
///
/// Peak flow: the largest mean over 60 s of what the supply gives, looked at from the start of the
/// test and of each stage and at refillings. A supply without a largest rate does not fill the ring
/// before the test: that water is poured and left out; a later step up or refilling is not.
/// Promised: volumes into the soil and from the supply.

#include "postprocess/reading/answer.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/test_plan.hpp"
#include "postprocess/reading/worst_figure.hpp"

namespace ringwright::postprocess {

/// @param outer whether of the annulus of a double ring @param stop a time sampled in all runs [s]
WaterUse water_use(const Question& question, const CompanionRuns& runs, bool outer, double stop,
                   WorstFigure& worst);

/// Water that stands in the (inner) ring and its vessel at the first head [m3].
double filling_volume(const solver::TestSetup& setup);

}  // namespace ringwright::postprocess
