#include "solver/time/step_solver.hpp"

#include <new>

namespace ringwright::solver {
namespace {

constexpr int kDone = SUN_NLS_SUCCESS;

StepSolver& of(SUNNonlinearSolver s) { return *static_cast<StepSolver*>(s->content); }

int solve(SUNNonlinearSolver self, N_Vector, N_Vector correction, N_Vector, realtype, booleantype,
          void*) {
  StepSolver& solver = of(self);
  try {
    return solver.solve_step(correction);
  } catch (...) {
    solver.error = std::current_exception();
    return -1;
  }
}

void set_counts(SUNNonlinearSolver s) {
  s->ops->getnumiters = [](SUNNonlinearSolver self, long* count) {
    *count = of(self).iterations;
    return kDone;
  };
  s->ops->getcuriter = [](SUNNonlinearSolver self, int* count) {
    *count = of(self).iterations;
    return kDone;
  };
  s->ops->getnumconvfails = [](SUNNonlinearSolver self, long* count) {
    *count = of(self).failures;
    return kDone;
  };
}

}  // namespace

NonlinearSolverHandle make_nonlinear_solver(StepSolver& solver, SUNContext context) {
  SUNNonlinearSolver s = SUNNonlinSolNewEmpty(context);
  if (!s) throw std::bad_alloc();
  s->content = &solver;
  s->ops->gettype = [](SUNNonlinearSolver) { return SUNNONLINEARSOLVER_ROOTFIND; };
  s->ops->initialize = [](SUNNonlinearSolver) { return kDone; };
  // IDA's own system, convergence test and limit are not used.
  s->ops->setsysfn = [](SUNNonlinearSolver, SUNNonlinSolSysFn) { return kDone; };
  s->ops->setctestfn = [](SUNNonlinearSolver, SUNNonlinSolConvTestFn, void*) { return kDone; };
  s->ops->setmaxiters = [](SUNNonlinearSolver, int) { return kDone; };
  s->ops->solve = solve;
  s->ops->free = [](SUNNonlinearSolver self) {
    SUNNonlinSolFreeEmpty(self);
    return kDone;
  };
  set_counts(s);
  return NonlinearSolverHandle(s);
}

}  // namespace ringwright::solver
