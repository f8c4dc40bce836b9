#include "postprocess/reading/companion_runs.hpp"

#include <algorithm>
#include <atomic>
#include <cmath>
#include <future>
#include <stdexcept>

namespace ringwright::postprocess {
namespace {

constexpr double kLooser = 10.0;

// @param least smallest error that may be stated
Figure combine(double fine, double coarse, double loose, double least) {
  return {fine, std::max(std::abs(fine - coarse) + std::abs(coarse - loose), std::abs(least))};
}

}  // namespace

const solver::Sample& sample_at(const solver::TestRun& run, double t) {
  const auto it = std::lower_bound(run.samples.begin(), run.samples.end(), t * (1 - 1e-12),
                                   [](const solver::Sample& s, double x) { return s.time < x; });
  if (it == run.samples.end() || it->time > t * (1 + 1e-12))
    throw std::out_of_range("no sample at this time");
  return *it;
}

double volume_at(const solver::TestRun& run, double t) {
  return t == 0.0 ? 0.0 : sample_at(run, t).ring_volume;
}

Figure CompanionRuns::figure(const std::function<double(const solver::TestRun&)>& f) const {
  const double value = f(fine);
  return combine(value, f(coarse), f(loose), floor * value);
}

Figure CompanionRuns::soil_volume(double t) const {
  return figure([t](const solver::TestRun& r) { return volume_at(r, t); });
}

Figure CompanionRuns::mean_flow(double from, double to) const {
  return figure([from, to](const solver::TestRun& r) {
    return (volume_at(r, to) - volume_at(r, from)) / (to - from);
  });
}

Figure CompanionRuns::steady_flow() const {
  return combine(steady_fine.ring_flow, steady_coarse.ring_flow, steady_coarse.ring_flow,
                 floor * steady_fine.ring_flow);
}

Figure CompanionRuns::steady_flow(const SteadyState& state) const {
  return combine(state.fine.ring_flow, state.coarse.ring_flow, state.coarse.ring_flow,
                 floor * state.fine.ring_flow);
}

Figure CompanionRuns::steady_outer_flow(const SteadyState& state) const {
  return combine(state.fine.outer_flow, state.coarse.outer_flow, state.coarse.outer_flow,
                 floor * state.fine.outer_flow);
}

Figure CompanionRuns::above_steady(double from, double to) const {
  return above_steady(from, to, {{}, steady_fine, steady_coarse});
}

Figure CompanionRuns::above_steady(double from, double to, const SteadyState& state) const {
  const auto excess = [&](const solver::TestRun& r, double steady) {
    return (volume_at(r, to) - volume_at(r, from)) / (to - from) / steady - 1.0;
  };
  const double value = excess(fine, state.fine.ring_flow);
  return combine(value, excess(coarse, state.coarse.ring_flow),
                 excess(loose, state.coarse.ring_flow), floor * (value + 1.0));
}

const SteadyState* CompanionRuns::steady_state(
    const std::optional<solver::SteadyHeads>& heads) const {
  if (!heads) return nullptr;
  for (const SteadyState& s : steady_states)
    if (s.heads.ring == heads->ring && s.heads.outer == heads->outer) return &s;
  return nullptr;
}

double CompanionRuns::last_common_time() const {
  double last = INFINITY;
  for (const solver::TestRun* run : {&fine, &coarse, &loose})
    last = std::min(last, run->samples.empty() ? 0.0 : run->samples.back().time);
  return last;
}

CompanionRuns run_companions(const CompanionWork& work, const solver::Resolution& resolution,
                             int threads, const solver::StepObserver& observer,
                             const std::function<bool()>& keep_going) {
  const auto policy = threads > 1 ? std::launch::async : std::launch::deferred;
  const solver::Resolution coarser = resolution.coarser();
  solver::Resolution looser = coarser;
  looser.theta_tolerance *= kLooser;
  solver::TestSetup plain = work.setup;
  plain.snapshots.clear();

  CompanionRuns runs;
  std::atomic<bool> stop{false};
  const auto going = [&] {
    if (keep_going && !keep_going()) stop = true;
    return !stop;
  };
  const auto unless_stopped = [&going](double) { return going(); };
  auto others = std::async(policy, [&] {
    runs.coarse = solver::run_test(plain, coarser, work.materials, unless_stopped);
    if (!going()) return;
    runs.loose = solver::run_test(plain, looser, work.materials, unless_stopped);
    if (!going()) return;
    for (const solver::SteadyHeads& heads : work.held) {
      const auto steady = [&](const solver::Resolution& r) {
        return solver::steady_flow(work.setup, heads, r, work.materials);
      };
      runs.steady_states.push_back({heads, steady(resolution), steady(coarser)});
    }
    if (runs.steady_states.empty()) return;
    runs.steady_fine = runs.steady_states.back().fine;
    runs.steady_coarse = runs.steady_states.back().coarse;
  });
  try {
    runs.fine = solver::run_test(work.setup, resolution, work.materials, observer);
  } catch (...) {
    stop = true;  // the others refer to this frame: end them before leaving it
    if (policy == std::launch::async) others.wait();
    throw;
  }
  if (runs.fine.interrupted) stop = true;
  if (!stop || policy == std::launch::async) others.get();
  if (!stop) return runs;
  CompanionRuns only_fine;  // how far the others came depends on the machine
  only_fine.fine = std::move(runs.fine);
  only_fine.interrupted = true;
  return only_fine;
}

}  // namespace ringwright::postprocess
