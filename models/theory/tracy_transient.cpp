#include "models/theory/tracy_transient.hpp"

#include <boost/math/special_functions/bessel.hpp>
#include <cmath>
#include <numbers>
#include <stdexcept>

namespace ringwright::models {
namespace {

constexpr double kFirstZeroOfJ0 = 2.404825557695773;

void check(const TracyProblem& p, double t) {
  if (!(p.Ks > 0.0 && p.alpha > 0.0 && p.content_range > 0.0 && p.width > 0.0 && p.height > 0.0)) {
    throw std::invalid_argument("Ks, alpha, theta_s - theta_r, width and height must be above 0");
  }
  if (!(p.h_r < 0.0)) throw std::invalid_argument("the initial head must be below 0");
  if (!(t >= 0.0)) throw std::invalid_argument("a time must not be below 0");
}

// sinh(b z) / sinh(b L) without overflow.
double sinh_ratio(double b, double z, double L) {
  return std::exp(b * (z - L)) * std::expm1(-2.0 * b * z) / std::expm1(-2.0 * b * L);
}

// The braces of the head comment. @param k_side pi/a or k1 [1/m]
double depth_factor(const TracyProblem& p, double k_side, double z, double t) {
  constexpr double vanished = 45.0;  // exp(-45) is far below the rounding of the sum
  const double L = p.height;
  const double c = p.alpha * p.content_range / p.Ks;
  const double b2 = 0.25 * p.alpha * p.alpha + k_side * k_side;
  double sum = 0.0;
  for (long k = 1;; ++k) {
    const double l = static_cast<double>(k) * std::numbers::pi / L;
    const double g = (b2 + l * l) / c;
    if (g * t > vanished) break;
    sum += (k % 2 == 0 ? 1.0 : -1.0) * l / g * std::sin(l * z) * std::exp(-g * t);
  }
  return sinh_ratio(std::sqrt(b2), z, L) + 2.0 / (L * c) * sum;
}

double head(const TracyProblem& p, double k_side, double s, double z, double t) {
  if (t == 0.0 && z < p.height) return p.h_r;
  const double dry = std::exp(p.alpha * p.h_r);
  // At the top every sine of the series is 0; their rounding would not sum up to it.
  const double depth = z >= p.height ? 1.0 : depth_factor(p, k_side, z, t);
  const double rise = (1.0 - dry) * s * std::exp(0.5 * p.alpha * (p.height - z)) * depth;
  return std::log(dry + rise) / p.alpha;
}

}  // namespace

double tracy_planar_head(const TracyProblem& problem, double x, double z, double t) {
  check(problem, t);
  const double k_side = std::numbers::pi / problem.width;
  return head(problem, k_side, std::sin(k_side * x), z, t);
}

double tracy_axisymmetric_head(const TracyProblem& problem, double r, double z, double t) {
  check(problem, t);
  const double k_side = kFirstZeroOfJ0 / problem.width;
  return head(problem, k_side, boost::math::cyl_bessel_j(0, k_side * r), z, t);
}

}  // namespace ringwright::models
