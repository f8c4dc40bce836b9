#include "solver/linear/klu_solver.hpp"

#include <klu.h>

#include <stdexcept>

namespace ringwright::solver {

struct KluSolver::Handles {
  klu_common common{};
  klu_symbolic* symbolic = nullptr;
  klu_numeric* numeric = nullptr;
  std::vector<int> column_starts, rows;
  long factorisations = 0;

  ~Handles() {
    klu_free_numeric(&numeric, &common);
    klu_free_symbolic(&symbolic, &common);
  }
};

KluSolver::KluSolver(const SparsePattern& pattern) : handles_(std::make_unique<Handles>()) {
  Handles& h = *handles_;
  klu_defaults(&h.common);
  // The matrix is irreducible and close to an M-matrix: no block triangular form, no
  // scaling (nor a check of the indices at every factorisation, which 0 would ask for), and
  // the diagonal as pivot unless it is tiny.
  h.common.btf = 0;
  h.common.scale = -1;
  h.common.tol = 1e-3;
  h.column_starts = pattern.column_starts;
  h.rows = pattern.rows;
  h.symbolic = klu_analyze(static_cast<int>(h.column_starts.size()) - 1, h.column_starts.data(),
                           h.rows.data(), &h.common);
  if (!h.symbolic) throw std::runtime_error("the sparse matrix could not be analysed");
}

KluSolver::~KluSolver() = default;
KluSolver::KluSolver(KluSolver&&) noexcept = default;
KluSolver& KluSolver::operator=(KluSolver&&) noexcept = default;

bool KluSolver::factorise(std::span<double> values) {
  Handles& h = *handles_;
  ++h.factorisations;
  if (h.numeric) {
    if (klu_refactor(h.column_starts.data(), h.rows.data(), values.data(), h.symbolic, h.numeric,
                     &h.common) &&
        klu_rcond(h.symbolic, h.numeric, &h.common) && h.common.rcond > 1e-200)
      return true;
    klu_free_numeric(&h.numeric, &h.common);
  }
  h.numeric =
      klu_factor(h.column_starts.data(), h.rows.data(), values.data(), h.symbolic, &h.common);
  return h.numeric != nullptr && h.common.status == KLU_OK;
}

void KluSolver::solve(std::span<double> b) {
  Handles& h = *handles_;
  klu_solve(h.symbolic, h.numeric, static_cast<int>(b.size()), 1, b.data(), &h.common);
}

long KluSolver::factorisations() const { return handles_->factorisations; }

}  // namespace ringwright::solver
