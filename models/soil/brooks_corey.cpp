#include "models/soil/brooks_corey.hpp"

#include <algorithm>
#include <cmath>
#include <stdexcept>

#include "models/soil/parameter_text.hpp"

namespace ringwright::models {
namespace {

constexpr double kDriestHead = -1e300;

void check(double h_b, double L, double eta) {
  if (!(h_b < 0.0) || std::isinf(h_b)) throw std::invalid_argument("entry head must be below 0");
  if (!(L > 0.0) || std::isinf(L)) throw std::invalid_argument("pore size index must be above 0");
  if (!(L * eta > 1.0) || std::isinf(eta))
    throw std::invalid_argument("pore size index times exponent must be above 1");
}

}  // namespace

BrooksCorey::BrooksCorey(double h_b, double L, double l)
    : h_b_(h_b), L_(L), eta_(2.0 + l + 2.0 / L) {
  if (!(l > -2.0)) throw std::invalid_argument("l must be above -2");
  check(h_b_, L_, eta_);
}

BrooksCorey BrooksCorey::burdine(double h_b, double L) {
  return with_exponent(h_b, L, 3.0 + 2.0 / L);
}

BrooksCorey BrooksCorey::with_exponent(double h_b, double L, double eta) {
  BrooksCorey curves(h_b, L);
  check(h_b, L, eta);
  curves.eta_ = eta;
  return curves;
}

double BrooksCorey::saturation(double h) const { return h < h_b_ ? std::pow(h_b_ / h, L_) : 1.0; }

double BrooksCorey::saturation_slope(double h) const {
  return h < h_b_ ? saturation(h) * L_ / -h : 0.0;
}

double BrooksCorey::relative_conductivity(double h) const {
  return h < h_b_ ? std::pow(h_b_ / h, L_ * eta_) : 1.0;
}

double BrooksCorey::relative_conductivity_slope(double h) const {
  return h < h_b_ ? relative_conductivity(h) * L_ * eta_ / -h : 0.0;
}

double BrooksCorey::head_at(double Se) const {
  if (!(Se > 0.0)) throw std::invalid_argument("no head for a saturation of 0 or less");
  if (Se >= 1.0) return h_b_;
  return std::clamp(h_b_ * std::pow(Se, -1.0 / L_), kDriestHead, h_b_);
}

double BrooksCorey::relative_flux_potential(double h) const {
  const double decay = L_ * eta_ - 1.0;
  if (h < h_b_) return relative_conductivity(h) * -h / decay;
  return -h_b_ / decay + (h - h_b_);
}

std::string BrooksCorey::describe() const {
  return "Brooks-Corey: entry head " + parameter_text(h_b_) + " m, pore size index " +
         parameter_text(L_) + ", conductivity exponent " + parameter_text(eta_);
}

}  // namespace ringwright::models
