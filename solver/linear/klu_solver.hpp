#pragma once
/// Direct solution of the sparse systems of Newton's method by KLU.

#include <memory>
#include <span>
#include <vector>

#include "solver/linear/sparse_pattern.hpp"

namespace ringwright::solver {

/// Keeps the symbolic analysis of one pattern and refactors with new values.
class KluSolver {
 public:
  explicit KluSolver(const SparsePattern& pattern);
  ~KluSolver();
  KluSolver(KluSolver&&) noexcept;
  KluSolver& operator=(KluSolver&&) noexcept;

  /// Factorises; false when the matrix is singular.
  bool factorise(std::span<double> values);
  /// Replaces b by the solution of A x = b.
  void solve(std::span<double> b);
  long factorisations() const;

 private:
  struct Handles;
  std::unique_ptr<Handles> handles_;
};

}  // namespace ringwright::solver
