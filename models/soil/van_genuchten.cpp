#include "models/soil/van_genuchten.hpp"

#include <algorithm>
#include <cmath>
#include <stdexcept>

#include "models/soil/parameter_text.hpp"

namespace ringwright::models {
namespace {

constexpr double kDriestHead = -1e300;

// ln(1 + exp(y)) for any y. Everything below is written with it: X itself overflows when dry and
// 1 - (X / (1 + X))^m loses all digits there.
double softplus(double y) {
  return y > 0.0 ? y + std::log1p(std::exp(-y)) : std::log1p(std::exp(y));
}

// F = 1 - (X / (1 + X))^m from y = ln X.
double pore_factor(double y, double m) { return -std::expm1(-m * softplus(-y)); }

void check(double alpha, double n, double l, double h_s) {
  if (!(alpha > 0.0) || std::isinf(alpha)) throw std::invalid_argument("alpha must be above 0");
  if (!(n > 1.0) || std::isinf(n)) throw std::invalid_argument("n must be above 1");
  if (!(l > -2.0) || std::isinf(l)) throw std::invalid_argument("l must be above -2");
  if (!(h_s <= 0.0) || std::isinf(h_s))
    throw std::invalid_argument("the minimum capillary height must not be above 0");
}

}  // namespace

VanGenuchten::VanGenuchten(double alpha, double n, double l, double h_s)
    : alpha_(alpha), n_(n), m_(1.0 - 1.0 / n), l_(l), h_s_(h_s), log_one_plus_x_s_(0.0), f_s_(1.0) {
  check(alpha, n, l, h_s);
  if (h_s < 0.0) {
    log_one_plus_x_s_ = softplus(log_x(h_s));
    f_s_ = pore_factor(log_x(h_s), m_);
  }
}

double VanGenuchten::log_x(double h) const { return n_ * std::log(alpha_ * -h); }

double VanGenuchten::saturation(double h) const {
  if (h >= h_s_) return 1.0;
  return std::exp(-m_ * (softplus(log_x(h)) - log_one_plus_x_s_));
}

double VanGenuchten::saturation_slope(double h) const {
  if (h >= h_s_) return 0.0;
  const double w = std::exp(-softplus(-log_x(h)));  // X / (1 + X)
  return saturation(h) * m_ * n_ * w / -h;
}

double VanGenuchten::relative_conductivity(double h) const {
  if (h >= h_s_) return 1.0;
  const double f = pore_factor(log_x(h), m_) / f_s_;
  return std::pow(saturation(h), l_) * f * f;
}

double VanGenuchten::relative_conductivity_slope(double h) const {
  if (h >= h_s_) return 0.0;
  const double y = log_x(h);
  const double w = std::exp(-softplus(-y));         // X / (1 + X)
  const double rest = std::exp(-softplus(y));       // 1 / (1 + X)
  const double w_m = std::exp(-m_ * softplus(-y));  // w^m
  const double per_log_head = l_ * w + 2.0 * w_m * rest / pore_factor(y, m_);
  return relative_conductivity(h) * m_ * n_ * per_log_head / -h;
}

double VanGenuchten::steepest_head() const {
  return std::min(-std::pow(m_, 1.0 / n_) / alpha_, h_s_);
}

double VanGenuchten::head_at(double Se) const {
  if (!(Se > 0.0)) throw std::invalid_argument("no head for a saturation of 0 or less");
  if (Se >= 1.0) return h_s_;
  // ln(1 + X), then ln X = ln expm1 of it; expm1 overflows in dry fine soil.
  const double y = log_one_plus_x_s_ - std::log(Se) / m_;
  const double log_x = y < 40.0 ? std::log(std::expm1(y)) : y;
  const double h = -std::exp(log_x / n_) / alpha_;
  return std::clamp(h, kDriestHead, h_s_);
}

std::string VanGenuchten::describe() const {
  return "van Genuchten - Mualem: alpha " + parameter_text(alpha_) + " 1/m, n " +
         parameter_text(n_) + ", l " + parameter_text(l_) + ", minimum capillary height " +
         parameter_text(h_s_) + " m";
}

}  // namespace ringwright::models
