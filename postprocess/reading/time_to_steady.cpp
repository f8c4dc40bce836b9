#include "postprocess/reading/time_to_steady.hpp"

#include <algorithm>
#include <cmath>

#include "solver/steady_ring.hpp"

namespace ringwright::postprocess {
namespace {

constexpr double kWithin = 0.05;
constexpr double kLongest = 1000.0 * 3600.0;  // [s]
constexpr double kStepRatio = 1.1;            // between the times looked at
constexpr double kDecades = 4.0;              // looked at, back from the end

std::vector<double> times_up_to(double end) {
  std::vector<double> times;
  for (double t = end; t > end * std::pow(10.0, -kDecades); t /= kStepRatio) times.push_back(t);
  std::reverse(times.begin(), times.end());
  return times;
}

}  // namespace

std::optional<TimeToSteady> time_to_steady(const solver::TestSetup& setup,
                                           const solver::Resolution& resolution,
                                           std::shared_ptr<const solver::CurveTable> table,
                                           const std::function<bool()>& keep_going) {
  const double steady_flow =
      solver::steady_flow({setup.soil, setup.ring, setup.pond_head}, resolution, table).ring_flow;
  // Wu et al. 1999 (SSSAJ 63:788): the approach scales with dtheta lambda / Ks.
  const double dtheta = setup.soil.theta_s - setup.soil.water_content(setup.initial_head);
  const double scale = dtheta * (table->capillary_length() + setup.pond_head) / setup.soil.Ks;
  solver::TestSetup on = setup;
  on.snapshots.clear();
  for (double end = std::max(setup.duration, 5.0 * scale);; end *= 4.0) {
    end = std::min(end, std::max(kLongest, setup.duration));
    on.duration = end;
    on.times = times_up_to(end);
    const solver::TestRun run = solver::run_test(
        on, resolution, table, [&](double) { return !keep_going || keep_going(); });
    if (run.interrupted) return std::nullopt;
    double last = 0.0;
    for (std::size_t i = 1; i < run.samples.size(); ++i) {
      const auto &a = run.samples[i - 1], &b = run.samples[i];
      const double flow = (b.ring_volume - a.ring_volume) / (b.time - a.time);
      if (std::abs(flow / steady_flow - 1.0) > kWithin) last = b.time;
    }
    if (last < end / 2 || end >= kLongest) return TimeToSteady{last, last > 0.99 * end};
  }
}

}  // namespace ringwright::postprocess
