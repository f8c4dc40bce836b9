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

double outer_head(const solver::TestSetup& setup) {
  const auto& stages = setup.outer_program.stages;
  return stages.empty() ? setup.pond_head : stages.front().head;
}

// The same heads without limits of the supply, evaporation and incidents.
solver::TestSetup held_for_good(const solver::TestSetup& setup) {
  solver::TestSetup on = setup;
  on.snapshots.clear();
  if (!setup.program.stages.empty()) on.pond_head = setup.program.stages.front().head;
  on.program = on.outer_program = {};
  if (setup.outer_ring && outer_head(setup) != on.pond_head)
    on.outer_program.stages = {{.head = outer_head(setup), .duration = kLongest}};
  return on;
}

// Last time the mean flow between samples is more than kWithin from steady, between the middles of
// the intervals; the end of the last sample when it still is there; 0 when it never is.
double last_crossing(const std::vector<solver::Sample>& samples, double steady_flow) {
  double last = 0.0, middle_before = 0.0, off_before = 0.0;
  for (std::size_t i = 1; i < samples.size(); ++i) {
    const solver::Sample &a = samples[i - 1], &b = samples[i];
    const double flow = (b.ring_volume - a.ring_volume) / (b.time - a.time);
    const double off = std::abs(flow / steady_flow - 1.0), middle = 0.5 * (a.time + b.time);
    if (off > kWithin)
      last = b.time;
    else if (off_before > kWithin)
      last = middle_before + (off_before - kWithin) / (off_before - off) * (middle - middle_before);
    middle_before = middle;
    off_before = off;
  }
  return last;
}

}  // namespace

std::optional<TimeToSteady> time_to_steady(const solver::TestSetup& setup,
                                           const solver::Resolution& resolution,
                                           const std::vector<solver::Material>& materials,
                                           const std::function<bool()>& keep_going) {
  solver::TestSetup on = held_for_good(setup);
  solver::SteadyHeads heads{on.pond_head};
  if (on.outer_ring) heads.outer = outer_head(on);
  const double steady_flow = solver::steady_flow(on, heads, resolution, materials).ring_flow;
  // Wu et al. 1999 (SSSAJ 63:788): the approach scales with dtheta lambda / Ks.
  const double dtheta = setup.soil.theta_s - setup.soil.water_content(setup.initial_head);
  const double lambda = materials.front().table->capillary_length();
  const double scale = dtheta * (lambda + on.pond_head) / setup.soil.Ks;
  for (double end = std::max(setup.duration, 5.0 * scale);; end *= 4.0) {
    end = std::min(end, std::max(kLongest, setup.duration));
    on.duration = end;
    on.times = times_up_to(end);
    const solver::TestRun run = solver::run_test(
        on, resolution, materials, [&](double) { return !keep_going || keep_going(); });
    if (run.interrupted) return std::nullopt;
    const double last = last_crossing(run.samples, steady_flow);
    if (last < end / 2 || end >= kLongest) return TimeToSteady{last, last > 0.99 * end};
  }
}

}  // namespace ringwright::postprocess
