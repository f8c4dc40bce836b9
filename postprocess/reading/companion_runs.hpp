#pragma once
/// One question run three times, so that every figure knows its own numerical error.
///
///   fine    the mesh and time tolerance chosen
///   coarse  cells twice as wide and high
///   loose   the coarse mesh with a ten times looser time tolerance
///
/// The error of a figure f is |f_fine - f_coarse| + |f_coarse - f_loose|, and not below a floor:
/// the full difference, not divided by a Richardson factor, since convergence is not monotone on
/// graded meshes. It overestimates, and is meant to. The steady flow has its own pair.

#include <functional>
#include <optional>
#include <vector>

#include "postprocess/reading/answer.hpp"
#include "solver/ground_materials.hpp"
#include "solver/steady_ring.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::postprocess {

/// Heads held for good, with the flow they come to on both meshes.
struct SteadyState {
  solver::SteadyHeads heads;
  solver::SteadyFlow fine, coarse;
};

struct CompanionRuns {
  solver::TestRun fine, coarse, loose;
  std::vector<SteadyState> steady_states;         ///< one for each of the heads asked for
  solver::SteadyFlow steady_fine, steady_coarse;  ///< of the last of them
  bool interrupted = false;                       ///< only `fine` is filled in, as far as it came
  double floor = 0.0;                             ///< least relative error of any figure [-]

  /// A figure made from any of the runs by the same function. @param f takes a TestRun
  Figure figure(const std::function<double(const solver::TestRun&)>& f) const;
  /// Volume into the soil at a sampled time t [m3].
  Figure soil_volume(double t) const;
  /// Mean flow between two sampled times [m3/s].
  Figure mean_flow(double from, double to) const;
  Figure steady_flow() const;  ///< of the last of the heads asked for [m3/s]
  Figure steady_flow(const SteadyState& state) const;        ///< into the (inner) ring [m3/s]
  Figure steady_outer_flow(const SteadyState& state) const;  ///< into the annulus [m3/s]
  /// Mean flow between two sampled times over the steady flow, minus 1 [-].
  Figure above_steady(double from, double to) const;
  Figure above_steady(double from, double to, const SteadyState& state) const;
  /// The state of these heads. @return null where there is none
  const SteadyState* steady_state(const std::optional<solver::SteadyHeads>& heads) const;
  /// Last time that was sampled in all three: runs that a reservoir ends, end at times of their
  /// own.
  double last_common_time() const;
};

/// The sample at a time that was sampled.
/// @throws std::out_of_range for a time that was not
const solver::Sample& sample_at(const solver::TestRun& run, double t);

/// Cumulative volume [m3] at a time that was sampled; 0 at time 0.
/// @throws std::out_of_range for a time that was not
double volume_at(const solver::TestRun& run, double t);

/// What companions share.
struct CompanionWork {
  const solver::TestSetup& setup;
  const std::vector<solver::Material>& materials;
  std::vector<solver::SteadyHeads> held;  ///< heads whose steady flow is asked for; may be empty
};

/// What the error of a rate read at t is held against at least [m3/s]: a twentieth of the mean flow
/// up to then. A ring that runs dry within a reading has a rate near nothing there, which no mesh
/// makes relatively exact.
constexpr double kLeastFlow = 0.05;
inline double least_flow(const solver::TestRun& run, double t) {
  return kLeastFlow * volume_at(run, t) / t;
}

/// Runs all of them; with more than one thread side by side, with the same result.
/// @param observer sees the fine run and may stop all @param keep_going asked by the others,
/// perhaps from another thread
CompanionRuns run_companions(const CompanionWork& work, const solver::Resolution& resolution,
                             int threads, const solver::StepObserver& observer,
                             const std::function<bool()>& keep_going = {});

/// The floor of the error for an accuracy asked for: two meshes may agree by chance, and the
/// table, the domain and Newton's tolerance are not seen by the companions. At a quarter, 96 and
/// 97 of two hundreds of random cases lie within their error, and its median is 4.6 and 4.9 times
/// the true one (validation/random_matrix).
inline double error_floor(double accuracy) { return 0.25 * accuracy; }

}  // namespace ringwright::postprocess
