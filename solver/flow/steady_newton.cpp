#include "solver/flow/steady_newton.hpp"

#include <algorithm>
#include <cmath>

#include "solver/linear/klu_solver.hpp"

namespace ringwright::solver {
namespace {

constexpr int kMostIterations = 200;
constexpr double kLargestDefect = 1e-7;    // of the inflow, in any cell
constexpr double kLargestRounding = 1e-5;  // the same where flat cells leave rounding errors
constexpr double kLargestChange = 1e-8;    // of the largest potential

class SteadyNewton {
 public:
  SteadyNewton(FlowSystem& flow, std::span<double> Phi)
      : flow_(flow),
        Phi_(Phi),
        klu_(flow.pattern()),
        matrix_(flow.pattern().rows.size()),
        out_(Phi.size()),
        step_(Phi.size()),
        u_(Phi.size()),
        trial_(Phi.size()) {}

  SteadyResult run();

 private:
  double defect(std::span<const double> Phi);
  double largest_defect() const;
  bool linearise(double damping);
  double move(double share);

  FlowSystem& flow_;
  std::span<double> Phi_;
  KluSolver klu_;
  std::vector<double> matrix_, out_, step_, u_, trial_;
  double inflow_ = 0.0;
};

// Sum of |net outflow|; the flow system holds the state of Phi afterwards.
double SteadyNewton::defect(std::span<const double> Phi) {
  for (std::size_t i = 0; i < u_.size(); ++i)
    u_[i] = flow_.table(static_cast<int>(i)).u_of_potential(Phi[i]);
  flow_.set_state(u_);
  flow_.net_outflow(out_);
  inflow_ = 0.0;
  for (double q : flow_.patch_outflow()) inflow_ += std::max(-q, 0.0);
  double sum = 0.0;
  for (double r : out_) sum += std::abs(r);
  return sum;
}

double SteadyNewton::largest_defect() const {
  double worst = 0.0;
  for (double r : out_) worst = std::max(worst, std::abs(r));
  return worst / inflow_;
}

// Newton step in Phi from the matrix in u, its columns divided by dPhi/du. `damping` holds each
// cell back in proportion to its own coefficient.
bool SteadyNewton::linearise(double damping) {
  std::fill(matrix_.begin(), matrix_.end(), 0.0);
  flow_.add_jacobian(matrix_);
  const SparsePattern& p = flow_.pattern();
  for (std::size_t j = 0; j < Phi_.size(); ++j) {
    const double scale = 1.0 / flow_.point(static_cast<int>(j)).dPhi;
    for (int k = p.column_starts[j]; k < p.column_starts[j + 1]; ++k)
      matrix_[static_cast<std::size_t>(k)] *= scale;
    double& diagonal = matrix_[static_cast<std::size_t>(p.diagonal[j])];
    diagonal += damping * std::abs(diagonal);
  }
  if (!klu_.factorise(matrix_)) return false;
  std::copy(out_.begin(), out_.end(), step_.begin());
  klu_.solve(step_);
  return true;
}

double SteadyNewton::move(double share) {
  double largest = 0.0;
  for (std::size_t i = 0; i < Phi_.size(); ++i) {
    trial_[i] = std::max(Phi_[i] - share * step_[i], 0.05 * Phi_[i]);
    largest = std::max(largest, std::abs(trial_[i] - Phi_[i]));
  }
  return largest;
}

SteadyResult SteadyNewton::run() {
  SteadyResult result;
  double now = defect(Phi_), damping = 0.0;
  const double top = *std::max_element(Phi_.begin(), Phi_.end());
  while (result.iterations < kMostIterations) {
    ++result.iterations;
    if (!linearise(damping)) return result;
    result.largest_defect = largest_defect();
    result.converged = damping == 0.0 && result.largest_defect < kLargestDefect &&
                       move(1.0) < kLargestChange * top;
    if (result.converged) break;
    double next = 0.0, share = 1.0;
    bool better = false;
    for (int halving = 0; halving < 4 && !better; ++halving, share *= 0.5) {
      move(share);
      next = defect(trial_);
      better = next < (1.0 - 1e-4 * share) * now || next < 1e-12 * inflow_;
    }
    // No step is better and none is left to take: rounding is what remains.
    if (!better && damping == 0.0 && result.largest_defect < kLargestRounding &&
        move(1.0) < kLargestChange * top) {
      result.converged = true;
      defect(Phi_);
      break;
    }
    if (better || damping > 1e3) {
      std::copy(trial_.begin(), trial_.end(), Phi_.begin());
      now = next;
      damping = damping < 1e-6 ? 0.0 : 0.2 * damping;
    } else {
      now = defect(Phi_);
      damping = damping > 0.0 ? 5.0 * damping : 0.01;
    }
  }
  return result;
}

}  // namespace

SteadyResult solve_steady(FlowSystem& flow, std::span<double> Phi) {
  return SteadyNewton(flow, Phi).run();
}

}  // namespace ringwright::solver
