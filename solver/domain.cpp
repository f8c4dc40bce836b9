#include "solver/domain.hpp"

#include <algorithm>
#include <cmath>

namespace ringwright::solver {
namespace {

// Far cells are large, so that a generous domain costs less than a second run.
constexpr double kReach = 4.0;

struct Spread {
  double capillary, gravity;  // [m]
};

Spread spread(const TestSetup& s, double lambda, double t) {
  const double dtheta = s.soil.theta_s - s.soil.water_content(s.initial_head);
  const double S2 = 2.0 * s.soil.Ks * dtheta * (s.pond_head + lambda);
  return {std::sqrt(S2 * t) / dtheta, s.soil.Ks * t / dtheta};
}

}  // namespace

double wetted_depth_estimate(const TestSetup& setup, double lambda, double t) {
  const Spread s = spread(setup, lambda, t);
  return s.capillary + s.gravity;
}

Domain transient_domain(const TestSetup& setup, double lambda) {
  const Spread s = spread(setup, lambda, setup.duration);
  return {setup.ring.radius + kReach * (s.capillary + lambda),
          setup.ring.insertion + kReach * (s.capillary + s.gravity + lambda)};
}

Domain steady_domain(const models::SingleRing& ring, double lambda) {
  const double a = ring.radius;
  const double reach = 100.0 * a * std::pow(std::max(lambda / a, 0.2), 0.6);
  return {a + reach, ring.insertion + reach};
}

}  // namespace ringwright::solver
