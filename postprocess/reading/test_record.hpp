#pragma once
/// The record of a test, true and as the crew has it.
///
/// The true record holds what went into the ground. The crew cannot see that: it sees what left
/// ring, vessel and tank together (the drop of the level times the vessel's area, plus what was
/// added, less what was bailed or bled), which is intake plus evaporation:
///   seen = supply - standing - removed = soil + evaporated

#include <cstddef>
#include <optional>
#include <vector>

#include "postprocess/reading/answer.hpp"
#include "postprocess/reading/test_plan.hpp"

namespace ringwright::postprocess {

/// Readings up to the last sample of the run; totals count from the start, the soak included.
models::Record true_record(const Question& question, const TestPlan& plan,
                           const solver::TestRun& run);

/// The same readings through the gauge.
models::Record record_as_read(const Question& question, const TestPlan& plan,
                              const solver::TestRun& run);

/// The rules of a question, the governing one first; from its older fields if the list is empty.
std::vector<models::StopRule> rules_of(const Question& question);

/// The stop by the governing rule on the record as read.
struct Stop {
  std::size_t reading = 0;  ///< the last one when the rule is never met
  bool rule_met = true;     ///< true where there is no rule
};
/// @param as_read with one reading at least
Stop stop_of(const Question& question, const TestPlan& plan, const models::Record& as_read);

}  // namespace ringwright::postprocess
