#include "solver/mesh/tip_correction.hpp"

#include <cmath>
#include <numbers>

namespace ringwright::solver {
namespace {

constexpr double pi = std::numbers::pi;

}  // namespace

double tip_factor(TipPoint p, TipPoint q, TipPoint a, TipPoint b) {
  const double exact = std::abs(std::sqrt(q).real() - std::sqrt(p).real());
  const double difference = std::abs(std::sqrt(b).imag() - std::sqrt(a).imag());
  return exact / (difference / std::abs(b - a) * std::abs(q - p));
}

TipField::TipField(const TipGround& ground) : ground_(ground) {
  // geometric mean of horizontal and vertical conductivity: vertical times stretch
  const double above_over_below = ground.contrast * ground.stretch_above / ground.stretch_below;
  s_ = 2.0 / pi * std::atan(std::sqrt(1.0 / above_over_below));
}

// Lengths are scaled by the stretch of either half; the amplitude above makes U continuous along
// the level of the foot for any two stretches.
double TipField::potential(TipPoint at) const {
  const bool below = at.real() >= 0.0;
  const double stretch = below ? ground_.stretch_below : ground_.stretch_above;
  const TipPoint w(at.real(), at.imag() / stretch);
  const double phi = std::abs(std::arg(w)), size = std::pow(std::abs(w), s_);
  const double joined =
      std::tan(s_ * pi / 2) * std::pow(ground_.stretch_above / ground_.stretch_below, s_);
  const double U = below ? size * std::sin(s_ * phi) : joined * size * std::cos(s_ * (pi - phi));
  return at.imag() < 0.0 ? -U : U;
}

// Exact flow K stretch L^s; two-point flow K stretch^2 (difference of U) / distance L.
double TipField::factor_below(double length, TipPoint a, TipPoint b) const {
  const double stretch = ground_.stretch_below;
  const double exact = stretch * std::pow(length, s_);
  const double two_point = stretch * stretch * std::abs(potential(a) - potential(b)) /
                           std::abs(a.imag() - b.imag()) * length;
  return exact / two_point;
}

// Exact flow K (below) stretch (L / stretch)^s cos(s pi/2); two-point flow with the resistances
// of the two halves in series.
double TipField::factor_beside(double length, TipPoint above, TipPoint below) const {
  const double stretch = ground_.stretch_below;
  const double exact = stretch * std::pow(length / stretch, s_) * std::cos(s_ * pi / 2);
  const double resistance = -above.real() / ground_.contrast + below.real();
  const double two_point = std::abs(potential(above) - potential(below)) / resistance * length;
  return exact / two_point;
}

}  // namespace ringwright::solver
