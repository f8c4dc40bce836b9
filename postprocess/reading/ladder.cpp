#include "postprocess/reading/ladder.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>

#include "models/estimators/reynolds_elrick_single_head.hpp"
#include "models/soil/capillary_length.hpp"
#include "postprocess/reading/test_times.hpp"
#include "postprocess/reading/true_kfs.hpp"

namespace ringwright::postprocess {
namespace {

constexpr std::size_t kRows = 5;       // besides the stop and the longest time
constexpr double kVolumesFrom = 0.05;  // of the stop
constexpr double kRatesFrom = 0.25;

Figure times(const Figure& f, double factor) {
  return {f.value * factor, f.error * std::abs(factor)};
}

double head_of(const Question& q) {
  const auto& stages = q.setup.program.stages;
  return stages.empty() ? q.setup.pond_head : stages.front().head;
}

// Both formulas are linear in the rate: the factors are per unit of rate.
struct PerRate {
  double rate_as_kfs, one_head, one_head_own_lambda;
};

PerRate reads_per_rate(const Question& q, double own_lambda) {
  const double a = q.setup.ring.radius, d = q.setup.ring.insertion, H = head_of(q);
  const double Ks = true_kfs(q);
  const auto kfs = [&](double alpha_star) {
    const models::SteadyRing unit_rate{.rate = 1.0, .head = H, .radius = a, .insertion = d};
    return models::reynolds_elrick_single_head(unit_rate, alpha_star);
  };
  return {1.0 / Ks, kfs(q.assumed_alpha_star) / Ks, kfs(1.0 / own_lambda) / Ks};
}

ReadsX reads(const Figure& rate, const PerRate& per) {
  return {times(rate, per.rate_as_kfs), times(rate, per.one_head),
          times(rate, per.one_head_own_lambda)};
}

}  // namespace

Ladder make_ladder(const Question& q, const CompanionRuns& runs, double stop) {
  const double area = std::numbers::pi * q.setup.ring.radius * q.setup.ring.radius;
  const PerRate per = reads_per_rate(q, models::capillary_length(*foot_soil(q.setup).curves));
  const bool has_program = !q.setup.program.stages.empty();
  const double filling = has_program ? 0.0 : area * q.setup.pond_head;
  WorstOf worst(runs);
  Ladder ladder;
  const bool whole = runs.last_common_time() >= q.setup.duration * (1 - 1e-9);
  const double longest = whole ? q.setup.duration : stop;
  for (double t : ladder_times(q.reading_interval, stop, longest, kRows)) {
    const double from = std::max(0.0, t - q.reading_interval);
    const auto flow = [&](const solver::TestRun& r) {
      return (volume_at(r, t) - (from > 1e-9 * t ? volume_at(r, from) : 0.0)) / (t - from);
    };
    const auto volume = [&](const solver::TestRun& r) { return volume_at(r, t); };
    LadderRow row;
    row.time = t;
    row.rate = times(runs.figure(flow), 1.0 / area);
    row.soil_volume = runs.figure(volume);
    row.supply_volume = {row.soil_volume.value + filling, row.soil_volume.error};
    if (has_program)
      row.supply_volume =
          runs.figure([t](const solver::TestRun& r) { return sample_at(r, t).water.supply; });
    row.reads = reads(row.rate, per);
    row.above_steady = runs.above_steady(from > 1e-9 * t ? from : 0.0, t);
    row.stops_here = std::abs(t - stop) <= 1e-9 * stop;
    if (t >= kVolumesFrom * stop) worst.promise(row.soil_volume, volume);
    const auto over_steady = [&](const solver::TestRun& r) {
      return flow(r) / (&r == &runs.fine ? runs.steady_fine : runs.steady_coarse).ring_flow;
    };
    // only a program can leave the ring dry
    const bool drinks = !has_program || sample_at(runs.fine, t).ring_flow > 0.0;
    if (t >= kRatesFrom * stop && drinks) {
      const double least = least_flow(runs.fine, t);
      worst.promise(runs.figure(flow), flow, least);
      // relative to the flow, not to the excess
      worst.promise(row.above_steady, over_steady, least / runs.steady_fine.ring_flow);
    }
    ladder.rows.push_back(std::move(row));
  }
  const Figure steady = runs.steady_flow();
  worst.promise(steady,
                std::abs(runs.steady_fine.ring_flow - runs.steady_coarse.ring_flow) / steady.value);
  ladder.steady_rate = times(steady, 1.0 / area);
  ladder.steady_reads = reads(ladder.steady_rate, per);
  ladder.worst = worst.worst();
  return ladder;
}

}  // namespace ringwright::postprocess
