#include "postprocess/reading/water_use.hpp"

#include <algorithm>
#include <numbers>

namespace ringwright::postprocess {
namespace {

constexpr double kPeakInterval = 60.0;  // [s]

double disc(double radius) { return std::numbers::pi * radius * radius; }

models::Vessel vessel_of(const solver::TestSetup& setup, bool outer) {
  const double inner = disc(setup.ring.radius);
  if (outer)
    return setup.outer_program.vessel.value_or(
        models::Vessel{disc(setup.outer_ring->radius) - inner});
  return setup.program.vessel.value_or(models::Vessel{inner});
}

const solver::RingWater& water_of(const solver::Sample& s, bool outer) {
  return outer ? s.outer_water : s.water;
}

bool has_sample(const solver::TestRun& run, double t) {
  return std::any_of(run.samples.begin(), run.samples.end(), [t](const solver::Sample& s) {
    return s.time >= t * (1 - 1e-9) && s.time <= t * (1 + 1e-9);
  });
}

// What the supply gave from `from` on in a minute, or in what there is of it.
double mean_supply(const solver::TestRun& run, bool outer, double from, double to, double before) {
  return (water_of(sample_at(run, to), outer).supply - before) / (to - from);
}

// A refilling takes a few seconds; the soil drinks meanwhile as it does in the reading.
double refill_peak(const solver::TestRun& run, const solver::Event& event,
                   const models::PondProgram& program, const models::Vessel& vessel, bool outer) {
  const auto after = std::find_if(run.samples.begin(), run.samples.end(),
                                  [&](const solver::Sample& s) { return s.time > event.time; });
  const double drunk =
      after == run.samples.end() ? 0.0 : water_of(*after, outer).soil_flow * kPeakInterval;
  double least = event.value;
  for (const models::Stage& s : program.stages)
    if (s.refill_below && s.head == event.value) least = *s.refill_below;
  return (vessel.volume(event.value) - vessel.volume(least) + drunk) / kPeakInterval;
}

double peak_flow(const Question& q, const solver::TestRun& run, bool outer, double stop) {
  const models::PondProgram& program = outer ? q.setup.outer_program : q.setup.program;
  const models::Vessel vessel = vessel_of(q.setup, outer);
  const auto stages = stages_of(program, q.setup.pond_head, q.setup.duration);
  const auto& largest = program.supply.largest_rate;
  double peak = 0.0;
  for (const PlannedStage& s : stages) {
    const double to = std::min(s.from + kPeakInterval, q.setup.duration);
    if (s.from >= stop || !has_sample(run, to) || (s.from > 0.0 && !has_sample(run, s.from)))
      continue;
    const double poured = largest ? 0.0 : vessel.volume(s.stage.head);
    const double before = s.from > 0.0 ? water_of(sample_at(run, s.from), outer).supply : poured;
    peak = std::max(peak, mean_supply(run, outer, s.from, to, before));
  }
  for (const solver::Event& e : run.events)
    if (e.kind == solver::EventKind::refilled && e.outer == outer && e.time < stop)
      peak = std::max(peak, refill_peak(run, e, program, vessel, outer));
  return largest ? std::min(peak, *largest) : peak;
}

}  // namespace

double filling_volume(const solver::TestSetup& setup) {
  const auto& stages = setup.program.stages;
  if (stages.empty()) return disc(setup.ring.radius) * setup.pond_head;
  return vessel_of(setup, false).volume(stages.front().head);
}

WaterUse water_use(const Question& q, const CompanionRuns& runs, bool outer, double stop,
                   WorstFigure& worst) {
  const auto soil = [&](const solver::TestRun& r) {
    return water_of(sample_at(r, stop), outer).soil;
  };
  const auto supply = [&](const solver::TestRun& r) {
    return water_of(sample_at(r, stop), outer).supply;
  };
  const solver::RingWater& water = water_of(sample_at(runs.fine, stop), outer);
  WaterUse use;
  use.soil = runs.figure(soil);
  use.supply = runs.figure(supply);
  use.standing = water.standing;
  use.evaporated = water.evaporated;
  use.removed = water.removed;
  use.peak_flow = peak_flow(q, runs.fine, outer, stop);
  WorstOf promised(runs);
  promised.promise(use.soil, soil);
  promised.promise(use.supply, supply);
  worst = worse_of(worst, promised.worst());
  return use;
}

}  // namespace ringwright::postprocess
