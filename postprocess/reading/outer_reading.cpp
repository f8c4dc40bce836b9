#include "postprocess/reading/outer_reading.hpp"

#include <cmath>
#include <numbers>

#include "postprocess/reading/scaled_figure.hpp"

namespace ringwright::postprocess {

OuterReading outer_reading(const Question& q, const TestPlan& plan, const CompanionRuns& runs,
                           const PlannedReading& last, WorstFigure& worst) {
  const double a = q.setup.ring.radius, b = q.setup.outer_ring->radius;
  const double area = std::numbers::pi * (b * b - a * a);
  const auto until = [](const solver::TestRun& r, double t) {
    return t == 0.0 ? 0.0 : sample_at(r, t).outer_water.soil;
  };
  const auto flow = [&](const solver::TestRun& r) {
    return (until(r, last.to) - until(r, last.from)) / (last.to - last.from);
  };
  WorstOf promised(runs);
  OuterReading reading;
  const Figure mean = runs.figure(flow);
  reading.rate = scaled(mean, 1.0 / area);
  // as least_flow(), of the annulus
  if (sample_at(runs.fine, last.to).outer_water.soil_flow > 0.0)
    promised.promise(mean, flow, kLeastFlow * until(runs.fine, last.to) / last.to);
  if (const SteadyState* state = runs.steady_state(plan.stages[last.stage].held)) {
    const Figure steady = runs.steady_outer_flow(*state);
    reading.steady_rate = scaled(steady, 1.0 / area);
    promised.promise(steady, std::abs(state->fine.outer_flow - state->coarse.outer_flow) /
                                 std::abs(state->fine.outer_flow));
  }
  worst = worse_of(worst, promised.worst());
  return reading;
}

}  // namespace ringwright::postprocess
