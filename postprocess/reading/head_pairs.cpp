#include "postprocess/reading/head_pairs.hpp"

#include <cmath>
#include <limits>
#include <numbers>

#include "models/estimators/two_head.hpp"
#include "postprocess/reading/scaled_figure.hpp"
#include "postprocess/reading/stage_readings.hpp"
#include "postprocess/reading/true_kfs.hpp"

namespace ringwright::postprocess {
namespace {

constexpr double kSameHead = 1e-6;  // [m]
constexpr double kArrived = 2e-3;   // [m], from the head set: the level is there

bool is_physical(const models::TwoHeadResult& r) {
  return r.Kfs > 0.0 && r.matric_flux_potential > 0.0;
}

// The last readings of two stages.
class Pair {
 public:
  Pair(const Question& q, const PlannedReading& first, const PlannedReading& second)
      : first_(first),
        second_(second),
        area_(std::numbers::pi * q.setup.ring.radius * q.setup.ring.radius),
        length_(models::nimmo_shape_length(q.setup.ring.radius, q.setup.ring.insertion)) {}

  models::TwoHeadResult of(const solver::TestRun& r) const {
    return models::two_head(reading(r, first_), reading(r, second_), length_);
  }

  void read(const models::Record& as_read, std::size_t one, std::size_t other,
            HeadPair& pair) const {
    const auto& readings = as_read.readings;
    if (std::abs(readings[one].head - readings[other].head) < kSameHead) {
      pair.kfs_as_read = std::numeric_limits<double>::quiet_NaN();
      pair.physical_as_read = false;
      return;
    }
    const auto result = models::two_head({readings[one].head, as_read.rate(one)},
                                         {readings[other].head, as_read.rate(other)}, length_);
    pair.kfs_as_read = result.Kfs;
    pair.physical_as_read = is_physical(result);
  }

 private:
  models::HeadAndRate reading(const solver::TestRun& r, const PlannedReading& at) const {
    const double volume = volume_at(r, at.to) - volume_at(r, at.from);
    return {sample_at(r, at.to).water.head, volume / (at.to - at.from) / area_};
  }

  PlannedReading first_, second_;
  double area_, length_;
};

}  // namespace

std::vector<HeadPair> head_pairs(const Question& q, const TestPlan& plan, const CompanionRuns& runs,
                                 const models::Record& as_read,
                                 const std::vector<StageReading>& stages, double stop,
                                 WorstFigure& worst) {
  std::vector<HeadPair> pairs;
  WorstOf promised(runs);
  const double Kfs = true_kfs(q);
  for (std::size_t k = 1; k < stages.size(); ++k) {
    const auto one = last_reading_of(plan, k - 1, stop), other = last_reading_of(plan, k, stop);
    const bool constant = plan.stages[k - 1].is_constant() && plan.stages[k].is_constant();
    if (!constant || !one || !other ||
        std::abs(stages[k - 1].head_to - stages[k].head_to) < kSameHead)
      continue;
    const Pair pair(q, plan.readings[*one], plan.readings[*other]);
    const auto kfs = [&](const solver::TestRun& r) { return pair.of(r).Kfs; };
    HeadPair result;
    result.first = k - 1, result.second = k;
    result.kfs = runs.figure(kfs);
    result.reads = scaled(result.kfs, 1.0 / Kfs);
    pair.read(as_read, *one, *other, result);
    const auto there = [&](std::size_t s) {
      return std::abs(stages[s].head_to - plan.stages[s].stage.head) < kArrived;
    };
    result.arrived = there(k - 1) && there(k);
    result.physical = result.arrived && is_physical(pair.of(runs.fine));
    result.physical_as_read = result.arrived && result.physical_as_read;
    if (result.arrived) promised.promise(result.kfs, kfs, Kfs);
    pairs.push_back(result);
  }
  worst = worse_of(worst, promised.worst());
  return pairs;
}

}  // namespace ringwright::postprocess
