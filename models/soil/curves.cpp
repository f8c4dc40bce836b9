#include "models/soil/curves.hpp"

#include <algorithm>
#include <boost/math/quadrature/gauss_kronrod.hpp>
#include <boost/math/tools/toms748_solve.hpp>
#include <cmath>
#include <cstdint>
#include <limits>
#include <stdexcept>

namespace ringwright::models {
namespace {

constexpr double kDriestHead = -1e300;

// Both defaults work in ln|h|: curves change over decades of suction, and so stay smooth.
double head_of(double log_suction) { return -std::exp(log_suction); }

// ln Se(h) - target, finite where Se underflows.
double log_excess(const Curves& curves, double log_suction, double log_Se) {
  const double Se = curves.saturation(head_of(log_suction));
  return std::log(std::max(Se, std::numeric_limits<double>::min())) - log_Se;
}

// Where to start the walk to a bracket: a suction at which the curve bends.
double typical_log_suction(const Curves& curves) {
  const double suction = -std::min(curves.steepest_head(), curves.entry_head());
  return suction > 0.0 ? std::log(suction) : 0.0;
}

// Integral of Kr over a factor exp(width) of suction, drier than h.
double panel(const Curves& curves, double h, double from, double width) {
  using Rule = boost::math::quadrature::gauss_kronrod<double, 31>;
  constexpr unsigned depth = 15;
  constexpr double tolerance = 1e-13;
  const auto integrand = [&](double v) {
    const double head = h * std::exp(v);
    return curves.relative_conductivity(head) * -head;
  };
  return Rule::integrate(integrand, from, from + width, depth, tolerance);
}

// Integral of Kr from minus infinity to h < 0. Outwards from h, so that it is relatively accurate
// however dry h is; the panels grow with suction at first (wet h), then fall for good.
double potential_below(const Curves& curves, double h) {
  constexpr double width = 2.0;
  constexpr double negligible = 1e-17;
  const double widest = std::log(kDriestHead / h);
  double total = 0.0;
  for (double v = 0.0; v < widest; v += width) {
    const double part = panel(curves, h, v, width);
    total += part;
    if (part <= negligible * total) break;
  }
  return total;
}

}  // namespace

double Curves::head_at(double Se) const {
  if (!(Se > 0.0)) throw std::invalid_argument("no head for a saturation of 0 or less");
  if (Se >= 1.0) return entry_head();
  constexpr double limit = 690.0;  // |ln| of suctions still inside the range of doubles
  const double log_Se = std::log(Se);
  const auto excess = [&](double s) { return log_excess(*this, s, log_Se); };
  double wet = typical_log_suction(*this);
  double dry = wet;
  while (excess(dry) > 0.0) {
    wet = dry;
    dry += 1.0 + 0.5 * std::abs(dry);
    if (dry > limit) return kDriestHead;
  }
  while (excess(wet) < 0.0) {
    dry = wet;
    wet -= 1.0 + 0.5 * std::abs(wet);
    if (wet < -limit) return entry_head();
  }
  if (wet == dry) return head_of(wet);
  std::uintmax_t steps = 200;
  const boost::math::tools::eps_tolerance<double> done(50);
  const auto [low, high] = boost::math::tools::toms748_solve(excess, wet, dry, done, steps);
  return std::min(head_of(0.5 * (low + high)), entry_head());
}

double Curves::relative_flux_potential(double h) const {
  // Between the wettest suction looked at and saturation Kr differs from 1 too little to matter.
  const double wettest = std::min(entry_head(), 1e-18 * steepest_head());
  if (h <= wettest && h < 0.0) return potential_below(*this, h);
  const double bend = wettest < 0.0 ? wettest : -1e-18;
  return potential_below(*this, bend) + (h - bend);
}

}  // namespace ringwright::models
