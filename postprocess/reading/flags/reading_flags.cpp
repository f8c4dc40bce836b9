#include <algorithm>
#include <cmath>

#include "models/ring/evaporation_share.hpp"
#include "models/ring/sealed_volume.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/flags/flags.hpp"

namespace ringwright::postprocess {
namespace {

constexpr double kLeastDivisions = 10.0;  // per reading (common practice, no source)
constexpr double kSwingShare = 0.1;       // of the daily flow, in one degree (common practice, no
                                          // source)
constexpr double kDay = 86400.0;          // [s]

// The reading that ends at the stop.
const PlannedReading* last_reading(const TestAsRead& test) {
  const PlannedReading* last = nullptr;
  for (const PlannedReading& r : test.plan.readings)
    if (r.to <= test.stop * (1 + 1e-9)) last = &r;
  return last;
}

struct Drunk {
  double soil = 0.0, evaporated = 0.0;  // [m3]
};

Drunk drunk_in(const TestAsRead& test, const PlannedReading& r) {
  const solver::Sample& to = sample_at(test.run, r.to);
  if (r.from == 0.0) return {to.ring_volume, to.water.evaporated};
  const solver::Sample& from = sample_at(test.run, r.from);
  return {to.ring_volume - from.ring_volume, to.water.evaporated - from.water.evaporated};
}

void below_gauge(const TestAsRead& test, const Drunk& drunk, std::vector<Flag>& flags) {
  const double division = test.question.gauge.volume_division;
  if (!(division > 0.0)) return;
  const double divisions = (drunk.soil + drunk.evaporated) / division;
  if (divisions < kLeastDivisions)
    flags.push_back({FlagKind::flow_below_gauge, divisions, kLeastDivisions});
}

void evaporation(const Drunk& drunk, std::vector<Flag>& flags) {
  if (!(drunk.evaporated > 0.0)) return;
  const double share = models::evaporation_share(drunk.evaporated, std::max(0.0, drunk.soil));
  if (share > models::largest_evaporation_share)
    flags.push_back({FlagKind::evaporation_share, share, models::largest_evaporation_share});
}

void sealed(const TestAsRead& test, const PlannedReading& r, const Drunk& drunk,
            std::vector<Flag>& flags) {
  const Circumstances& c = test.question.circumstances;
  if (!c.sealed_volume) return;
  const double per_degree =
      std::abs(models::sealed_volume_per_degree(*c.sealed_volume, c.water_temperature));
  const double allowed = kSwingShare * drunk.soil / (r.to - r.from) * kDay;
  if (per_degree > allowed) flags.push_back({FlagKind::sealed_temperature, per_degree, allowed});
}

}  // namespace

void reading_flags(const TestAsRead& test, std::vector<Flag>& flags) {
  if (const PlannedReading* last = last_reading(test)) {
    const Drunk drunk = drunk_in(test, *last);
    below_gauge(test, drunk, flags);
    evaporation(drunk, flags);
    sealed(test, *last, drunk, flags);
  }
  if (!test.rule_met) flags.push_back({FlagKind::stop_rule_not_met, test.above_steady});
  if (test.run.statistics.domain_reached)
    flags.push_back({FlagKind::domain_reached, test.run.statistics.domain_depth});
}

}  // namespace ringwright::postprocess
