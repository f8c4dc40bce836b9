#include "models/theory/green_ampt.hpp"

#include <boost/math/tools/toms748_solve.hpp>
#include <cmath>
#include <cstdint>
#include <stdexcept>

namespace ringwright::models {
namespace {

double storage_potential(const GreenAmpt& soil) {
  const double P = (soil.psi + soil.H) * soil.dtheta;
  if (!(soil.K > 0.0 && soil.dtheta > 0.0 && P > 0.0)) {
    throw std::invalid_argument("K, theta_s - theta_i and suction plus pond must be above 0");
  }
  return P;
}

// x - ln(1 + x), without cancellation for small x.
double excess(double x) {
  if (x > 1e-3) return x - std::log1p(x);
  return x * x * (1.0 / 2.0 - x * (1.0 / 3.0 - x * (1.0 / 4.0 - x * (1.0 / 5.0 - x / 6.0))));
}

}  // namespace

double green_ampt_infiltration(const GreenAmpt& soil, double t) {
  const double P = storage_potential(soil);
  if (!(t >= 0.0)) throw std::invalid_argument("a time must not be below 0");
  if (t == 0.0) return 0.0;
  const double T = soil.K * t / P;
  // sqrt(2 T) <= I/P <= sqrt(2 T) + T, since excess(x) <= x^2/2 and q falls to K.
  const double low = std::sqrt(2.0 * T);
  const double high = 1.0000001 * (low + T);
  std::uintmax_t steps = 100;
  const boost::math::tools::eps_tolerance<double> done(50);
  const auto bracket = boost::math::tools::toms748_solve([T](double x) { return excess(x) - T; },
                                                         0.9999999 * low, high, done, steps);
  return 0.5 * P * (bracket.first + bracket.second);
}

double green_ampt_rate(const GreenAmpt& soil, double I) {
  const double P = storage_potential(soil);
  if (!(I > 0.0)) throw std::invalid_argument("the rate exists once water has gone in only");
  return soil.K * (1.0 + P / I);
}

}  // namespace ringwright::models
