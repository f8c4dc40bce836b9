#include "postprocess/reading/stage_readings.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include "postprocess/reading/scaled_figure.hpp"

namespace ringwright::postprocess {
namespace {

constexpr double kVolumesFrom = 0.05;  // of the stop
constexpr double kRounding = 1e-9;

// A level that only the soil brings down starts from the head before.
double head_at_start(const PlannedStage& s, const solver::TestRun& run) {
  if (s.from == 0.0 || s.stage.down != models::StepDown::fall) return s.stage.head;
  return std::max(s.stage.head, sample_at(run, s.from).water.head);
}

class StageReader {
 public:
  StageReader(const Question& q, const CompanionRuns& runs)
      : runs_(runs),
        area_(std::numbers::pi * q.setup.ring.radius * q.setup.ring.radius),
        worst_(runs) {}

  void read_volume(const PlannedStage& s, double stop, StageReading& reading) {
    const auto volume = [&](const solver::TestRun& r) {
      return volume_at(r, reading.to) - volume_at(r, s.from);
    };
    reading.soil_volume = runs_.figure(volume);
    if (reading.to >= kVolumesFrom * stop) worst_.promise(reading.soil_volume, volume);
  }

  void read_rate(const PlannedReading& last, StageReading& reading) {
    const auto flow = [&](const solver::TestRun& r) {
      return (volume_at(r, last.to) - volume_at(r, last.from)) / (last.to - last.from);
    };
    const Figure mean = runs_.figure(flow);
    reading.rate = scaled(mean, 1.0 / area_);
    // A ring that ran dry in its last reading has no rate there that could be promised.
    if (sample_at(runs_.fine, last.to).water.soil_flow > 0.0)
      worst_.promise(mean, flow, least_flow(runs_.fine, last.to));
  }

  void read_steady(const PlannedStage& s, StageReading& reading) {
    const SteadyState* state = runs_.steady_state(s.held);
    if (!state) return;
    const Figure flow = runs_.steady_flow(*state);
    reading.steady_rate = scaled(flow, 1.0 / area_);
    worst_.promise(flow, std::abs(state->fine.ring_flow - state->coarse.ring_flow) /
                             std::abs(state->fine.ring_flow));
  }

  const WorstFigure& worst() const { return worst_.worst(); }

 private:
  const CompanionRuns& runs_;
  double area_;
  WorstOf worst_;
};

}  // namespace

std::optional<std::size_t> last_reading_of(const TestPlan& plan, std::size_t stage, double stop) {
  std::optional<std::size_t> last;
  for (std::size_t i = 0; i < plan.readings.size(); ++i)
    if (plan.readings[i].stage == stage && plan.readings[i].to <= stop * (1 + kRounding)) last = i;
  return last;
}

std::vector<StageReading> stage_readings(const Question& q, const TestPlan& plan,
                                         const CompanionRuns& runs, const models::Record& as_read,
                                         double stop, WorstFigure& worst) {
  StageReader reader(q, runs);
  std::vector<StageReading> all;
  for (std::size_t k = 0; k < plan.stages.size(); ++k) {
    const PlannedStage& s = plan.stages[k];
    if (s.from >= stop * (1 - kRounding)) break;
    StageReading reading;
    reading.stage = s.index;
    reading.soak = s.stage.soak;
    reading.from = s.from;
    reading.to = std::min(s.to, stop);
    reading.head_from = head_at_start(s, runs.fine);
    reading.head_to = sample_at(runs.fine, reading.to).water.head;
    reader.read_volume(s, stop, reading);
    if (!s.stage.soak) reader.read_steady(s, reading);
    if (const auto last = last_reading_of(plan, k, stop)) {
      reader.read_rate(plan.readings[*last], reading);
      reading.rate_as_read = as_read.rate(*last);
    }
    all.push_back(reading);
  }
  worst = worse_of(worst, reader.worst());
  return all;
}

}  // namespace ringwright::postprocess
