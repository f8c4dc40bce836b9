#pragma once
/// Owners of SUNDIALS objects. Members of a struct that holds them must be declared in the
/// order context, vectors, nonlinear solver, integrator: they are destroyed in reverse, the
/// integrator first and the context last.

#include <ida/ida.h>
#include <nvector/nvector_serial.h>
#include <sundials/sundials_context.h>
#include <sundials/sundials_nonlinearsolver.h>
#include <sundials/sundials_version.h>

#include <memory>
#include <stdexcept>
#include <type_traits>

namespace ringwright::solver {

static_assert(SUNDIALS_VERSION_MAJOR == 6, "written for the interfaces of SUNDIALS 6");

struct FreeContext {
  void operator()(SUNContext c) const { SUNContext_Free(&c); }
};
struct FreeVector {
  void operator()(N_Vector v) const { N_VDestroy(v); }
};
struct FreeNonlinearSolver {
  void operator()(SUNNonlinearSolver s) const { SUNNonlinSolFree(s); }
};
struct FreeIda {
  void operator()(void* m) const { IDAFree(&m); }
};

using ContextHandle = std::unique_ptr<std::remove_pointer_t<SUNContext>, FreeContext>;
using VectorHandle = std::unique_ptr<std::remove_pointer_t<N_Vector>, FreeVector>;
using NonlinearSolverHandle =
    std::unique_ptr<std::remove_pointer_t<SUNNonlinearSolver>, FreeNonlinearSolver>;
using IdaHandle = std::unique_ptr<void, FreeIda>;

inline ContextHandle make_context() {
  SUNContext c = nullptr;
  if (SUNContext_Create(nullptr, &c) != 0) throw std::runtime_error("no SUNDIALS context");
  return ContextHandle(c);
}

inline VectorHandle make_vector(sunindextype size, SUNContext context) {
  N_Vector v = N_VNew_Serial(size, context);
  if (!v) throw std::bad_alloc();
  return VectorHandle(v);
}

}  // namespace ringwright::solver
