#pragma once
/// Newton's method for one implicit step of the flow equation, in the switched unknown u.
///
///   r_i(u) = V_i [ W'_i + c (W_i(u) - W_i) ] + net outflow_i(u) = 0
///
/// where W, W' are what the time integrator predicts and c its leading coefficient. The
/// storage is a function of u at every iterate, so the accepted state satisfies
/// theta = theta(h) identically and nothing is ever extrapolated in h across a front.
///
/// The convergence test is a maximum over the cells, not a mean (and, for the water balance, the
/// sum of the defects, and that of every pond, against the flow through the boundary): a mean over
/// a graded mesh is diluted by idle cells and accepts steps whose front is unconverged. The matrix
/// is kept while it contracts well and refreshed within the iteration when it does not; a fresh
/// matrix that contracts badly is no failure by itself.

#include <span>
#include <vector>

#include "solver/flow/flow_system.hpp"
#include "solver/linear/klu_solver.hpp"

namespace ringwright::solver {

struct NewtonTolerances {
  double storage = 1e-5;  ///< largest defect r / (c V) accepted [-]
  double balance = 5e-7;  ///< sum of the defects, and those of ponds, over the flow through the
                          ///< boundary [-]
  double unknown = 2e-4;  ///< largest remaining error of u accepted [m]
  int iterations = 16;    ///< most per step
};

class SwitchedNewton {
 public:
  SwitchedNewton(FlowSystem& flow, const NewtonTolerances& tolerances);

  /// Solves for u, starting from the u given; on success the flow system holds the state and
  /// its flows. @return false when it does not converge
  bool solve(std::span<const double> W, std::span<const double> W_rate, double c,
             std::span<double> u);

  /// Forget the matrix (after a jump of a boundary condition).
  void reset() { matrix_c_ = 0.0; }

  long iterations() const { return iterations_; }
  long factorisations() const { return klu_.factorisations(); }
  int last_iterations() const { return last_iterations_; }
  std::span<const double> last_defects() const { return residual_; }

 private:
  double residual(std::span<const double> W, std::span<const double> W_rate, double c,
                  std::span<const double> u);
  bool refresh(double c);
  double update(std::span<double> u) const;

  FlowSystem& flow_;
  NewtonTolerances tolerances_;
  KluSolver klu_;
  std::vector<double> residual_, step_, matrix_;
  double imbalance_ = 0.0;  // of the last residual, over its tolerance
  double matrix_c_ = 0.0;   // the coefficient the matrix was made with; 0: none
  long iterations_ = 0;
  int last_iterations_ = 0;
};

}  // namespace ringwright::solver
