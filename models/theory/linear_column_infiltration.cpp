#include "models/theory/linear_column_infiltration.hpp"

#include <cmath>
#include <numbers>
#include <stdexcept>

namespace ringwright::models {
namespace {

// exp(y) erfc(x) for x >= 0 where the factors alone would over- and underflow; beyond x = 25 by
// the first terms of the asymptotic series, there exact to rounding.
double scaled_erfc(double y, double x) {
  if (x < 25.0) return std::exp(y) * std::erfc(x);
  const double u = 1.0 / (2.0 * x * x);
  const double series = 1.0 - u * (1.0 - 3.0 * u * (1.0 - 5.0 * u * (1.0 - 7.0 * u)));
  return std::exp(y - x * x) * series * std::numbers::inv_sqrtpi / x;
}

}  // namespace

LinearColumnInfiltration::LinearColumnInfiltration(double Ks, double alpha, double content_range,
                                                   double h_i)
    : Ks_(Ks),
      alpha_(alpha),
      Ki_(Ks * std::exp(alpha * h_i)),
      k_(Ks / content_range),
      D_(Ks / (alpha * content_range)) {
  if (!(Ks > 0.0 && alpha > 0.0 && content_range > 0.0)) {
    throw std::invalid_argument("Ks, alpha and theta_s - theta_r must be above 0");
  }
  if (!(h_i < 0.0)) throw std::invalid_argument("the initial head must be below 0");
}

double LinearColumnInfiltration::rate(double t) const {
  if (!(t > 0.0)) throw std::invalid_argument("the rate exists after t = 0 only");
  const double tau = 0.5 * k_ * std::sqrt(t / D_);
  const double bell = std::exp(-tau * tau) * std::numbers::inv_sqrtpi;
  return Ki_ + (Ks_ - Ki_) * (0.5 * (1.0 + std::erf(tau)) + 0.5 * bell / tau);
}

double LinearColumnInfiltration::infiltration(double t) const {
  if (!(t >= 0.0)) throw std::invalid_argument("a time must not be below 0");
  if (t == 0.0) return 0.0;
  const double tau = 0.5 * k_ * std::sqrt(t / D_);
  const double bell = std::exp(-tau * tau) * std::numbers::inv_sqrtpi;
  const double shape =
      0.5 * t * (1.0 + std::erf(tau)) + 0.5 * t * bell / tau + D_ / (k_ * k_) * std::erf(tau);
  return Ki_ * t + (Ks_ - Ki_) * shape;
}

double LinearColumnInfiltration::head(double depth, double t) const {
  if (!(depth >= 0.0 && t >= 0.0))
    throw std::invalid_argument("depth and time must not be below 0");
  if (depth == 0.0) return 0.0;
  if (t == 0.0) return std::log(Ki_ / Ks_) / alpha_;
  const double width = 2.0 * std::sqrt(D_ * t);
  const double share = 0.5 * (std::erfc((depth - k_ * t) / width) +
                              scaled_erfc(k_ * depth / D_, (depth + k_ * t) / width));
  return std::log((Ki_ + (Ks_ - Ki_) * share) / Ks_) / alpha_;
}

}  // namespace ringwright::models
