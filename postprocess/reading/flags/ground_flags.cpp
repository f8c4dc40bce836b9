#include <algorithm>

#include "models/ground/piping.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/flags/closed_ring.hpp"
#include "postprocess/reading/flags/flags.hpp"

namespace ringwright::postprocess {
namespace {

constexpr double kLeastSeen = 1e-6;          // [m3]: less does not show beside a ring
constexpr double kInsertionShare = 1.0 / 3;  // of a liner (common practice, no source)
constexpr double kPipingMargin = 1.5;        // on the critical gradient; common practice, no source
constexpr double kLeastPores = 0.40;         // [-]; common practice, no source
constexpr double kWaterDensity = 1000.0, kGrainDensity = 2650.0;  // [kg/m3]

void surfacing(const TestAsRead& test, std::vector<Flag>& flags) {
  const solver::Surfacing& s = test.run.surfacing;
  if (!s.happened || s.first_time > test.stop) return;
  const double volume = sample_at(test.run, test.stop).seepage_volume;
  if (volume >= kLeastSeen)
    flags.push_back({FlagKind::surfacing, volume, s.first_time, s.farthest});
}

// A soil given by its fillable porosity alone shows fewer pores than it has, and would be taken for
// rock.
double pores_of(const models::Soil& soil) { return std::max(soil.theta_s, kLeastPores); }

// The wall between water and open ground: the outer one of a double ring.
void piping(const TestAsRead& test, std::vector<Flag>& flags) {
  const solver::TestSetup& setup = test.question.setup;
  const bool outer = setup.outer_ring.has_value();
  const double d = outer ? setup.outer_ring->insertion : setup.ring.insertion;
  // An open ring set on the ground has no wall to pipe along: water beside it is surfacing.
  if (d <= 0.0 && !is_closed_ring(test.question)) return;
  const double index = models::piping_index(highest_head(test, outer), d);
  const double limit = models::critical_exit_gradient(pores_of(setup.soil)) / kPipingMargin;
  if (index > limit) flags.push_back({FlagKind::piping, index, limit, 0.0, outer});
}

// Under a lid only: an open pond hardly weighs more than the ground its ring is driven into.
void fracture(const TestAsRead& test, std::vector<Flag>& flags) {
  const Question& q = test.question;
  const double d = q.setup.ring.insertion, pores = pores_of(q.setup.soil);
  if (!is_closed_ring(q) || d <= 0.0) return;
  const double density =
      q.circumstances.bulk_density.value_or((1 - pores) * kGrainDensity + pores * kWaterDensity);
  const double share = 1.0 / models::fracture_margin(highest_head(test, false), d, density);
  if (share > 1.0) flags.push_back({FlagKind::fracture, share, 1.0});
}

void insertion_share(const TestAsRead& test, std::vector<Flag>& flags) {
  const auto& liner = test.question.circumstances.liner;
  if (!liner) return;
  const solver::TestSetup& setup = test.question.setup;
  double d = setup.ring.insertion;
  const bool outer = setup.outer_ring && setup.outer_ring->insertion > d;
  if (outer) d = setup.outer_ring->insertion;
  if (d > kInsertionShare * *liner)
    flags.push_back({FlagKind::insertion_share, d / *liner, kInsertionShare, 0.0, outer});
}

}  // namespace

void ground_flags(const TestAsRead& test, std::vector<Flag>& flags) {
  surfacing(test, flags);
  piping(test, flags);
  fracture(test, flags);
  insertion_share(test, flags);
}

}  // namespace ringwright::postprocess
