#include "postprocess/reading/read_runs.hpp"

#include "postprocess/reading/head_pairs.hpp"
#include "postprocess/reading/ladder.hpp"
#include "postprocess/reading/outer_reading.hpp"
#include "postprocess/reading/rule_verdicts.hpp"
#include "postprocess/reading/stage_readings.hpp"
#include "postprocess/reading/test_record.hpp"
#include "postprocess/reading/water_use.hpp"

namespace ringwright::postprocess {
namespace {

constexpr double kRounding = 1e-9;

// Readings that all three runs have: a reservoir ends them at times of their own.
std::size_t common_readings(const TestPlan& plan, const CompanionRuns& runs) {
  const double last = runs.last_common_time();
  std::size_t n = 0;
  while (n < plan.readings.size() && plan.readings[n].to <= last * (1 + kRounding)) ++n;
  return n;
}

void read_ladder(const CompanionRuns& runs, double stop, Answer& answer, WorstFigure& worst) {
  const Ladder ladder = make_ladder(answer.question, runs, stop);
  answer.ladder = ladder.rows;
  answer.steady_rate = ladder.steady_rate;
  answer.steady_reads = ladder.steady_reads;
  worst = worse_of(worst, ladder.worst);
}

void read_stages(const TestPlan& plan, const CompanionRuns& runs, double stop, Answer& answer,
                 WorstFigure& worst) {
  const Question& q = answer.question;
  answer.stages = stage_readings(q, plan, runs, answer.as_read, stop, worst);
  answer.pairs = head_pairs(q, plan, runs, answer.as_read, answer.stages, stop, worst);
  if (plan.is_constant) return;
  answer.steady_rate = {};
  for (const StageReading& s : answer.stages)
    if (!s.soak && s.steady_rate.value > 0.0) answer.steady_rate = s.steady_rate;
}

void read_wetted(const CompanionRuns& runs, double stop, Answer& answer) {
  answer.wetted_depth =
      runs.figure([stop](const solver::TestRun& r) { return sample_at(r, stop).wetted.depth; });
  answer.wetted_beyond_wall = runs.figure(
      [stop](const solver::TestRun& r) { return sample_at(r, stop).wetted.beyond_wall; });
}

}  // namespace

double stop_time(const Answer& answer) {
  return answer.record.readings.empty() ? 0.0 : answer.record.readings.back().time;
}

WorstFigure read_runs(const TestPlan& plan, const CompanionRuns& runs, Answer& answer) {
  const Question& q = answer.question;
  WorstFigure worst;
  answer.record = true_record(q, plan, runs.fine);
  answer.as_read = record_as_read(q, plan, runs.fine);
  const std::size_t common = common_readings(plan, runs);
  answer.ended_early = common < plan.readings.size();
  answer.record.readings.resize(common);
  answer.as_read.readings.resize(common);
  answer.verdicts = rule_verdicts(q, plan, runs, answer.as_read);
  answer.stop_rule_met = answer.verdicts.empty() || answer.verdicts.front().stop.has_value();
  if (common == 0) return worst;
  const Stop at = stop_of(q, plan, answer.as_read);
  answer.record.readings.resize(at.reading + 1);
  answer.as_read.readings.resize(at.reading + 1);
  const double stop = stop_time(answer);
  if (plan.is_constant) read_ladder(runs, stop, answer, worst);
  if (plan.has_program) read_stages(plan, runs, stop, answer, worst);
  answer.water = water_use(q, runs, false, stop, worst);
  if (q.setup.outer_ring) {
    answer.outer_water = water_use(q, runs, true, stop, worst);
    answer.outer = outer_reading(q, plan, runs, plan.readings[at.reading], worst);
  }
  read_wetted(runs, stop, answer);
  return worst;
}

}  // namespace ringwright::postprocess
