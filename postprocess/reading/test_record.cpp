#include "postprocess/reading/test_record.hpp"

#include <algorithm>
#include <numbers>

#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/stop_rule.hpp"

namespace ringwright::postprocess {
namespace {

template <class Volume>
models::Record record_of(const Question& q, const TestPlan& plan, const solver::TestRun& run,
                         const Volume& volume_of) {
  models::Record record;
  record.ring_area = std::numbers::pi * q.setup.ring.radius * q.setup.ring.radius;
  const auto volume_until = [&](double t) { return t == 0.0 ? 0.0 : volume_of(sample_at(run, t)); };
  for (const PlannedReading& r : plan.readings) {
    if (run.samples.empty() || r.to > run.samples.back().time * (1 + 1e-9)) break;
    const double volume = volume_until(r.to);
    record.readings.push_back({r.to, r.to - r.from, volume - volume_until(r.from), volume,
                               std::max(0.0, sample_at(run, r.to).water.head)});
  }
  return record;
}

}  // namespace

models::Record true_record(const Question& q, const TestPlan& plan, const solver::TestRun& run) {
  return record_of(q, plan, run, [](const solver::Sample& s) { return s.ring_volume; });
}

models::Record record_as_read(const Question& q, const TestPlan& plan, const solver::TestRun& run) {
  const models::Record seen = record_of(
      q, plan, run, [](const solver::Sample& s) { return s.ring_volume + s.water.evaporated; });
  return models::as_read(seen, q.gauge, plan.stage_starts());
}

std::vector<models::StopRule> rules_of(const Question& q) {
  if (!q.rules.empty() || q.stop_readings == 0) return q.rules;
  return {{.kind = models::StopKind::change_within_share,
           .readings = q.stop_readings,
           .share = q.stop_within}};
}

Stop stop_of(const Question& q, const TestPlan& plan, const models::Record& as_read) {
  const std::size_t last = as_read.readings.size() - 1;
  const auto rules = rules_of(q);
  if (rules.empty()) return {last, true};
  const auto found = first_stop(as_read, rules.front(), plan.stage_starts());
  return {found.value_or(last), found.has_value()};
}

}  // namespace ringwright::postprocess
