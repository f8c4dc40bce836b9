#include "models/theory/srivastava_yeh.hpp"

#include <boost/math/tools/toms748_solve.hpp>
#include <cmath>
#include <cstdint>
#include <numbers>
#include <stdexcept>

namespace ringwright::models {
namespace {

// Root k = 1, 2, ... of tan(l L) + 2 l = 0, which lies in ((k - 1/2) pi/L, k pi/L).
double root(int k, double L) {
  const auto f = [L](double l) { return std::sin(l * L) + 2.0 * l * std::cos(l * L); };
  const double half = std::numbers::pi / L;
  std::uintmax_t steps = 100;
  const boost::math::tools::eps_tolerance<double> done(52);
  const auto [low, high] =
      boost::math::tools::toms748_solve(f, (k - 0.5) * half, k * half, done, steps);
  return 0.5 * (low + high);
}

double steady(double q, double z) { return q - (q - 1.0) * std::exp(-z); }

}  // namespace

double srivastava_yeh_conductivity(const SrivastavaYehProblem& problem, double z, double t) {
  const double L = problem.L;
  if (!(L > 0.0 && z >= 0.0 && z <= L && t >= 0.0)) {
    throw std::invalid_argument("z* must lie in the column and t* must not be below 0");
  }
  if (t == 0.0) return steady(problem.q_A, z);
  constexpr double vanished = 45.0;
  double sum = 0.0;
  for (int k = 1;; ++k) {
    const double l = root(k, L);
    if (l * l * t > vanished) break;
    sum += std::sin(l * z) * std::sin(l * L) * std::exp(-l * l * t) /
           (1.0 + 0.5 * L + 2.0 * l * l * L);
  }
  return steady(problem.q_B, z) -
         4.0 * (problem.q_B - problem.q_A) * std::exp(0.5 * (L - z) - 0.25 * t) * sum;
}

}  // namespace ringwright::models
