#pragma once
/// The nonlinear solver that IDA sees: hands every implicit step to one of ours.
///
/// IDA adds up the counts after each call, hence they are those of the last call. Nothing may be
/// thrown across the C library: an exception is kept and IDA told to give up.

#include <exception>

#include "solver/time/sundials_handles.hpp"

namespace ringwright::solver {

class StepSolver {
 public:
  virtual ~StepSolver() = default;

  /// Puts the step's solution minus its prediction into `correction`.
  /// @return SUN_NLS_SUCCESS, or SUN_NLS_CONV_RECVR for a shorter step
  virtual int solve_step(N_Vector correction) = 0;

  int iterations = 0;        ///< of the last call
  int failures = 0;          ///< 1 when the last call did not converge
  std::exception_ptr error;  ///< thrown by the last call
};

/// @param solver must outlive the handle
NonlinearSolverHandle make_nonlinear_solver(StepSolver& solver, SUNContext context);

}  // namespace ringwright::solver
