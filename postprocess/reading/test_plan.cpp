#include "postprocess/reading/test_plan.hpp"

#include <algorithm>
#include <cmath>

#include "postprocess/reading/test_times.hpp"

namespace ringwright::postprocess {
namespace {

constexpr double kRounding = 1e-9;
constexpr double kPeakInterval = 60.0;  // [s]
constexpr double kStub = 0.5;           // of an interval: shorter is no reading of its own

bool is_one_constant_head(const models::PondProgram& program) {
  return program.stages.empty() || (program.stages.size() == 1 && !program.stages[0].soak &&
                                    program.stages[0].kind == models::StageKind::constant_head);
}

bool same(const solver::SteadyHeads& a, const solver::SteadyHeads& b) {
  return a.ring == b.ring && a.outer == b.outer;
}

void read_stage(const Question& q, std::size_t stage, bool merge, TestPlan& plan) {
  const PlannedStage& s = plan.stages[stage];
  std::vector<double> ends = reading_times(q.reading_interval, s.to - s.from);
  if (merge && ends.size() > 1 && ends.back() - ends[ends.size() - 2] < kStub * q.reading_interval)
    ends.erase(ends.end() - 2);
  double before = s.from;
  for (double end : ends) {
    plan.readings.push_back({before, s.from + end, stage});
    before = s.from + end;
  }
}

// Which heads are held at the end of each stage of the (inner) ring.
void find_held(const solver::TestSetup& setup, std::vector<PlannedStage>& stages) {
  const auto outer = stages_of(setup.outer_program, setup.pond_head, setup.duration);
  for (PlannedStage& s : stages) {
    if (!s.is_constant()) continue;
    solver::SteadyHeads held{s.stage.head};
    if (setup.outer_ring) {
      const auto at = std::find_if(outer.begin(), outer.end(), [&](const PlannedStage& o) {
        return o.to >= s.to * (1 - kRounding);
      });
      if (at == outer.end() || !at->is_constant()) continue;
      held.outer = at->stage.head;
    }
    s.held = held;
  }
}

}  // namespace

void add_times(std::vector<double>& times, const std::vector<double>& more) {
  times.insert(times.end(), more.begin(), more.end());
  std::sort(times.begin(), times.end());
  const auto equal = [](double a, double b) { return b - a <= kRounding * b; };
  times.erase(std::unique(times.begin(), times.end(), equal), times.end());
}

std::vector<PlannedStage> stages_of(const models::PondProgram& program, double pond_head,
                                    double duration) {
  std::vector<models::Stage> stages = program.stages;
  if (stages.empty()) stages.push_back({.head = pond_head, .duration = duration});
  std::vector<PlannedStage> on_clock;
  double from = 0.0;
  for (std::size_t k = 0; k < stages.size() && from < duration * (1 - kRounding); ++k) {
    double to = from + stages[k].duration;
    if (k + 1 == stages.size() || to > duration * (1 - kRounding)) to = duration;
    on_clock.push_back({k, stages[k], from, to, std::nullopt});
    from = to;
  }
  return on_clock;
}

std::vector<double> TestPlan::stage_starts() const {
  std::vector<double> starts;
  for (const PlannedStage& s : stages) starts.push_back(s.from);
  return starts;
}

std::vector<solver::SteadyHeads> TestPlan::held_heads() const {
  std::vector<solver::SteadyHeads> all;
  for (const PlannedStage& s : stages) {
    if (!s.held || s.stage.soak) continue;
    std::erase_if(all, [&](const solver::SteadyHeads& h) { return same(h, *s.held); });
    all.push_back(*s.held);
  }
  return all;
}

TestPlan plan_of(const Question& q) {
  TestPlan plan;
  plan.stages = stages_of(q.setup.program, q.setup.pond_head, q.setup.duration);
  plan.has_program = !q.setup.program.stages.empty();
  plan.is_constant = is_one_constant_head(q.setup.program) &&
                     (!q.setup.outer_ring || is_one_constant_head(q.setup.outer_program));
  find_held(q.setup, plan.stages);
  for (std::size_t k = 0; k < plan.stages.size(); ++k)
    if (!plan.stages[k].stage.soak) read_stage(q, k, plan.stages.size() > 1, plan);
  return plan;
}

std::vector<double> wanted_times(const Question& q, const TestPlan& plan) {
  const double duration = q.setup.duration;
  std::vector<double> times;
  for (const PlannedReading& r : plan.readings) times.push_back(r.to);
  for (const PlannedStage& s : plan.stages) {
    times.push_back(s.to);
    times.push_back(std::min(s.from + kPeakInterval, duration));
  }
  if (plan.is_constant) {
    for (double t : stopping_times(q.reading_interval, duration)) {
      times.push_back(t);
      if (t > q.reading_interval * (1 + kRounding)) times.push_back(t - q.reading_interval);
    }
    const double before_end = duration - q.reading_interval;
    if (before_end > kRounding * duration) times.push_back(before_end);
  }
  add_times(times, {});
  return times;
}

}  // namespace ringwright::postprocess
