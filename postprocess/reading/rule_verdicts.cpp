#include "postprocess/reading/rule_verdicts.hpp"

#include <numbers>

#include "postprocess/reading/scaled_figure.hpp"
#include "postprocess/reading/stop_rule.hpp"
#include "postprocess/reading/test_record.hpp"

namespace ringwright::postprocess {

Figure excess_of_reading(const TestPlan& plan, const CompanionRuns& runs, std::size_t reading) {
  const PlannedReading& r = plan.readings[reading];
  const SteadyState* state = runs.steady_state(plan.stages[r.stage].held);
  return state ? runs.above_steady(r.from, r.to, *state) : Figure{};
}

std::vector<RuleVerdict> rule_verdicts(const Question& q, const TestPlan& plan,
                                       const CompanionRuns& runs, const models::Record& as_read) {
  const double area = std::numbers::pi * q.setup.ring.radius * q.setup.ring.radius;
  std::vector<RuleVerdict> verdicts;
  for (const models::StopRule& rule : rules_of(q)) {
    RuleVerdict verdict;
    verdict.rule = rule;
    if (const auto at = first_stop(as_read, rule, plan.stage_starts())) {
      const PlannedReading& r = plan.readings[*at];
      verdict.stop = r.to;
      verdict.rate = scaled(runs.mean_flow(r.from, r.to), 1.0 / area);
      verdict.above_steady = excess_of_reading(plan, runs, *at);
      verdict.supply_volume = runs.figure(
          [&](const solver::TestRun& run) { return sample_at(run, r.to).water.supply; });
    }
    verdicts.push_back(verdict);
  }
  return verdicts;
}

}  // namespace ringwright::postprocess
