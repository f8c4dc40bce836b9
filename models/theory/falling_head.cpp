#include "models/theory/falling_head.hpp"

#include <algorithm>
#include <boost/math/tools/toms748_solve.hpp>
#include <cmath>
#include <cstdint>
#include <stdexcept>

namespace ringwright::models {
namespace {

void check(const FallingHead& test) {
  if (!(test.K > 0.0)) throw std::invalid_argument("K must be above 0");
  if (!(test.psi >= 0.0)) throw std::invalid_argument("a suction must not be below 0");
  if (!(test.dtheta > 0.0 && test.dtheta < 1.0))
    throw std::invalid_argument("theta_s - theta_i must lie between 0 and 1");
  if (!(test.H0 > 0.0)) throw std::invalid_argument("the first head must be above 0");
  if (!(test.area_ratio > 0.0)) throw std::invalid_argument("an area ratio must be above 0");
}

// (x - ln(1 + x)) / x^2 for x > -1; 1/2 at 0. The closed form cancels near 0: series there.
double excess_over_square(double x) {
  if (std::abs(x) > 0.02) return (x - std::log1p(x)) / (x * x);
  double sum = 0.0;
  for (int k = 12; k >= 2; --k) sum = 1.0 / k - x * sum;
  return sum;
}

double supply(const FallingHead& test) { return test.H0 / test.area_ratio; }

double time_of(const FallingHead& test, double I) {
  const double P = (test.H0 + test.psi) * test.dtheta;
  const double C = 1.0 - test.area_ratio * test.dtheta;
  return I * I / (test.K * P) * excess_over_square(C * I / P);
}

}  // namespace

double falling_head_time(const FallingHead& test, double I) {
  check(test);
  const double all = supply(test);
  if (!(I >= 0.0)) throw std::invalid_argument("an infiltrated depth must not be below 0");
  if (!(I <= all * (1.0 + 1e-12)))
    throw std::invalid_argument("no more can go in than the vessel holds");
  return time_of(test, std::min(I, all));
}

double falling_head_infiltration(const FallingHead& test, double t) {
  check(test);
  if (!(t >= 0.0)) throw std::invalid_argument("a time must not be below 0");
  const double all = supply(test);
  if (t >= time_of(test, all)) return all;
  if (t == 0.0) return 0.0;
  // In ln I, so that early times keep their digits; the bracket walks down from the whole vessel.
  const auto excess = [&](double s) { return std::log(time_of(test, std::exp(s)) / t); };
  const double high = std::log(all);
  double low = high - 1.0;
  while (excess(low) > 0.0) low = high - 2.0 * (high - low);
  std::uintmax_t steps = 100;
  const boost::math::tools::eps_tolerance<double> done(50);
  const auto found = boost::math::tools::toms748_solve(excess, low, high, done, steps);
  return std::exp(0.5 * (found.first + found.second));
}

double simplified_falling_head_kfs(double depth, double dtheta, double psi, double time) {
  if (!(time > 0.0)) throw std::invalid_argument("a time must be above 0");
  return falling_head_time({1.0, psi, dtheta, depth, 1.0}, depth) / time;
}

}  // namespace ringwright::models
