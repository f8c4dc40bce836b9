#include "solver/settle.hpp"

#include <algorithm>
#include <cmath>

#include "solver/failure.hpp"
#include "solver/time/integrator.hpp"

namespace ringwright::solver {
namespace {

constexpr double kThetaTolerance = 0.02;  // the way there does not matter
constexpr double kSettled = 1e-6;         // |in - out| over in
// Dry ground far below may take ages to fill while nothing happens any more at the ring: settled
// too is an inflow that changed by less than this while the time grew by the factor.
constexpr double kStill = 2e-6, kWhile = 8.0;
constexpr int kMostSteps = 4000;
constexpr double kLongest = 1e16;  // [s]

struct Through {
  double in = 0.0, net = 0.0;
};

Through through(const FlowSystem& flow) {
  Through t;
  for (double q : flow.patch_outflow()) t.in += std::max(-q, 0.0), t.net += q;
  return t;
}

}  // namespace

SteadyResult settle(FlowSystem& flow, std::span<const double> u) {
  SteadyResult result;
  Integrator integrator(flow, kThetaTolerance);
  std::vector<double> out(u.size());
  double before = 0.0, before_time = 0.0;  // an inflow and when it was
  try {
    integrator.start(0.0, u);
    while (result.iterations < kMostSteps && integrator.time() < 0.1 * kLongest) {
      integrator.step(kLongest);
      ++result.iterations;
      flow.set_state(integrator.u());
      flow.net_outflow(out);
      const Through now = through(flow);
      result.largest_defect = std::abs(now.net) / now.in;
      const bool long_enough = integrator.time() > kWhile * before_time && before_time > 0.0;
      result.converged = result.largest_defect < kSettled ||
                         (long_enough && std::abs(now.in / before - 1) < kStill);
      if (result.converged) break;
      if (long_enough || before_time == 0.0) before = now.in, before_time = integrator.time();
    }
  } catch (const SolverFailure&) {
    result.converged = false;
  }
  return result;
}

}  // namespace ringwright::solver
