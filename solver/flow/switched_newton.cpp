#include "solver/flow/switched_newton.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

namespace ringwright::solver {
namespace {

constexpr double kWorstContraction = 0.45;  // slower than this: new matrix
constexpr double kLargestCoefficientChange = 1.67;
constexpr double kRoundOff = 1e-14;  // of the storage, in the sum of the defects
// Stands for what is not a number, which any maximum would lose again.
constexpr double kBeyondNumbers = std::numeric_limits<double>::infinity();

}  // namespace

SwitchedNewton::SwitchedNewton(FlowSystem& flow, const NewtonTolerances& tolerances)
    : flow_(flow),
      tolerances_(tolerances),
      klu_(flow.pattern()),
      residual_(static_cast<std::size_t>(flow.unknowns())),
      step_(residual_.size()),
      matrix_(flow.pattern().rows.size()) {}

double SwitchedNewton::residual(std::span<const double> W, std::span<const double> W_rate, double c,
                                std::span<const double> u) {
  flow_.set_state(u);
  flow_.net_outflow(residual_);
  const auto V = flow_.volume();
  const auto cells = static_cast<std::size_t>(flow_.cells());
  double worst = 0.0, sum = 0.0, ponds = 0.0, total_volume = 0.0, through = 0.0;
  for (std::size_t i = 0; i < residual_.size(); ++i) {
    residual_[i] += V[i] * (W_rate[i] + c * (flow_.storage(static_cast<int>(i)) - W[i]));
    const double size = std::abs(residual_[i]) / (c * V[i]);
    if (!(size <= worst)) worst = std::isnan(size) ? kBeyondNumbers : size;
    sum += residual_[i];
    if (i >= cells) ponds += std::abs(residual_[i]);
    total_volume += V[i];
  }
  for (double q : flow_.patch_outflow()) through += std::abs(q);
  imbalance_ =
      (std::abs(sum) + ponds) / (tolerances_.balance * through + kRoundOff * c * total_volume);
  return worst;
}

bool SwitchedNewton::refresh(double c) {
  std::fill(matrix_.begin(), matrix_.end(), 0.0);
  flow_.add_jacobian(matrix_);
  const auto V = flow_.volume();
  const std::vector<int>& diagonal = flow_.pattern().diagonal;
  for (std::size_t i = 0; i < V.size(); ++i)
    matrix_[static_cast<std::size_t>(diagonal[i])] +=
        c * V[i] * flow_.storage_slope(static_cast<int>(i));
  matrix_c_ = c;
  return klu_.factorise(matrix_);
}

double SwitchedNewton::update(std::span<double> u) const {
  double largest = 0.0;
  for (std::size_t i = 0; i < u.size(); ++i) {
    const auto [driest, entry, turn] = flow_.bounds(static_cast<int>(i));
    const double old = u[i];
    double next = old - step_[i];
    const double size = std::abs(step_[i]);
    if (!(size <= largest)) largest = std::isnan(size) ? kBeyondNumbers : size;
    // Water content stays positive: keep a tenth of the way to the driest state.
    next = std::max(next, driest + 0.1 * (old - driest));
    // The storage slope jumps at saturation: land near the kink when crossing it.
    if ((old < entry) != (next < entry)) next = entry + 0.3 * (next - entry);
    u[i] = next;
  }
  return largest;
}

bool SwitchedNewton::solve(std::span<const double> W, std::span<const double> W_rate, double c,
                           std::span<double> u) {
  last_iterations_ = 0;
  double defect = residual(W, W_rate, c, u);
  const double change = matrix_c_ > 0.0 ? std::max(c / matrix_c_, matrix_c_ / c) : 1e300;
  bool stale = change > kLargestCoefficientChange;
  double previous = 0.0;
  for (int k = 0; k < tolerances_.iterations; ++k) {
    if (stale && !refresh(c)) return false;
    stale = false;
    std::copy(residual_.begin(), residual_.end(), step_.begin());
    klu_.solve(step_);
    const double largest = update(u);
    ++iterations_, ++last_iterations_;
    if (!(largest < 1e12)) return matrix_c_ = 0.0, false;
    const double contraction = k > 0 ? largest / previous : 0.0;
    const double old_defect = defect;
    defect = residual(W, W_rate, c, u);
    const double remaining =
        k > 0 && contraction < 0.9 ? largest * contraction / (1 - contraction) : largest;
    if (defect < tolerances_.storage && remaining < tolerances_.unknown && imbalance_ < 1.0)
      return true;
    stale = contraction > kWorstContraction || !(defect < kWorstContraction * old_defect);
    previous = largest;
  }
  matrix_c_ = 0.0;
  return false;
}

}  // namespace ringwright::solver
