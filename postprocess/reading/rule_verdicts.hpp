#pragma once
/// What each stop rule would do, and how far from steady the flow truly was then. Nothing of it is
/// promised beyond what the governing rule's stop is: other rules may stop where figures are rough.

#include <vector>

#include "postprocess/reading/answer.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/test_plan.hpp"

namespace ringwright::postprocess {

/// @param as_read up to the longest time
std::vector<RuleVerdict> rule_verdicts(const Question& question, const TestPlan& plan,
                                       const CompanionRuns& runs, const models::Record& as_read);

/// Mean flow of one reading over the steady one of its stage, minus 1; value 0 where there is none.
Figure excess_of_reading(const TestPlan& plan, const CompanionRuns& runs, std::size_t reading);

}  // namespace ringwright::postprocess
