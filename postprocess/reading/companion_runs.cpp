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

Figure CompanionRuns::above_steady(double from, double to) const {
  const auto excess = [&](const solver::TestRun& r, double steady) {
    return (volume_at(r, to) - volume_at(r, from)) / (to - from) / steady - 1.0;
  };
  const double value = excess(fine, steady_fine.ring_flow);
  return combine(value, excess(coarse, steady_coarse.ring_flow),
                 excess(loose, steady_coarse.ring_flow), floor * (value + 1.0));
}

CompanionRuns run_companions(const solver::TestSetup& setup, const solver::Resolution& resolution,
                             std::shared_ptr<const solver::CurveTable> table, int threads,
                             const solver::StepObserver& observer,
                             const std::function<bool()>& keep_going) {
  const auto policy = threads > 1 ? std::launch::async : std::launch::deferred;
  const solver::Resolution coarser = resolution.coarser();
  solver::Resolution looser = coarser;
  looser.theta_tolerance *= kLooser;
  solver::TestSetup plain = setup;
  plain.snapshots.clear();
  const solver::SteadyRing steady{setup.soil, setup.ring, setup.pond_head};

  CompanionRuns runs;
  std::atomic<bool> stop{false};
  const auto going = [&] {
    if (keep_going && !keep_going()) stop = true;
    return !stop;
  };
  const auto unless_stopped = [&going](double) { return going(); };
  auto others = std::async(policy, [&] {
    runs.coarse = solver::run_test(plain, coarser, table, unless_stopped);
    if (!going()) return;
    runs.loose = solver::run_test(plain, looser, table, unless_stopped);
    if (!going()) return;
    runs.steady_fine = solver::steady_flow(steady, resolution, table);
    runs.steady_coarse = solver::steady_flow(steady, coarser, table);
  });
  try {
    runs.fine = solver::run_test(setup, resolution, table, observer);
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
