#include "solver/linear/klu_solver.hpp"

#include <Eigen/Dense>
#include <catch2/catch.hpp>
#include <random>

using namespace ringwright::solver;

namespace {

/// Pattern of a chain of n cells: tridiagonal.
SparsePattern chain(int n) {
  SparsePattern p;
  p.column_starts.push_back(0);
  for (int j = 0; j < n; ++j) {
    for (int i = std::max(0, j - 1); i <= std::min(n - 1, j + 1); ++i) {
      if (i == j) p.diagonal.push_back(static_cast<int>(p.rows.size()));
      p.rows.push_back(i);
    }
    p.column_starts.push_back(static_cast<int>(p.rows.size()));
  }
  return p;
}

Eigen::MatrixXd dense(const SparsePattern& p, const std::vector<double>& values) {
  const int n = static_cast<int>(p.diagonal.size());
  Eigen::MatrixXd A = Eigen::MatrixXd::Zero(n, n);
  for (int j = 0; j < n; ++j)
    for (int k = p.column_starts[static_cast<std::size_t>(j)];
         k < p.column_starts[static_cast<std::size_t>(j) + 1]; ++k)
      A(p.rows[static_cast<std::size_t>(k)], j) = values[static_cast<std::size_t>(k)];
  return A;
}

}  // namespace

TEST_CASE("direct solver: the solution of random matrices, first and refactored",
          "[solver][linear]") {
  const int n = 30;
  const SparsePattern p = chain(n);
  KluSolver klu(p);
  std::mt19937 generator(2);
  std::uniform_real_distribution<double> value(-1.0, 1.0);
  for (int round = 0; round < 4; ++round) {
    std::vector<double> values, b;
    for (std::size_t k = 0; k < p.rows.size(); ++k) values.push_back(value(generator));
    for (int d : p.diagonal) values[static_cast<std::size_t>(d)] += 3.0;
    for (int i = 0; i < n; ++i) b.push_back(value(generator));
    const Eigen::VectorXd expected =
        dense(p, values).partialPivLu().solve(Eigen::Map<Eigen::VectorXd>(b.data(), n));
    REQUIRE(klu.factorise(values));
    klu.solve(b);
    for (int i = 0; i < n; ++i)
      CHECK(b[static_cast<std::size_t>(i)] == Approx(expected(i)).epsilon(1e-10).margin(1e-13));
  }
  CHECK(klu.factorisations() == 4);
}

TEST_CASE("direct solver: a singular matrix is refused, a good one afterwards taken",
          "[solver][linear]") {
  const SparsePattern p = chain(5);
  KluSolver klu(p);
  std::vector<double> zero(p.rows.size(), 0.0), good(p.rows.size(), 0.1);
  for (int d : p.diagonal) good[static_cast<std::size_t>(d)] = 1.0;
  CHECK_FALSE(klu.factorise(zero));
  CHECK(klu.factorise(good));
  CHECK_FALSE(klu.factorise(zero));
  REQUIRE(klu.factorise(good));
  std::vector<double> b(5, 1.0);
  klu.solve(b);
  const Eigen::VectorXd r = dense(p, good) * Eigen::Map<Eigen::VectorXd>(b.data(), 5);
  for (int i = 0; i < 5; ++i) CHECK(r(i) == Approx(1.0).epsilon(1e-12));
}
