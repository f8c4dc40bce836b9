#include "models/soil/durner.hpp"

#include <algorithm>
#include <boost/math/tools/toms748_solve.hpp>
#include <cmath>
#include <cstdint>
#include <limits>
#include <stdexcept>

#include "models/soil/parameter_text.hpp"

namespace ringwright::models {
namespace {

constexpr double kStep = 0.01;  // in ln|h|
// Flatter than this, dSe/d ln|h|, saturation does not fix the head: a look-up table over it was off
// by 5e-6 at 1.2e-3, by 7e-4 at 4e-4 and by 3e-3 at 1e-4 (measured on flux potentials).
constexpr double kPlateau = 1e-3;

// ln(1 + exp(y)) for any y; see van_genuchten.cpp.
double softplus(double y) {
  return y > 0.0 ? y + std::log1p(std::exp(-y)) : std::log1p(std::exp(y));
}

double m_of(const PoreSystem& p) { return 1.0 - 1.0 / p.n; }
double log_x(const PoreSystem& p, double h) { return p.n * std::log(p.alpha * -h); }

// Head of the largest slope of one system alone: X = m.
double own_steepest_head(const PoreSystem& p) { return -std::pow(m_of(p), 1.0 / p.n) / p.alpha; }

// w dS/dh.
double weighted_slope(const PoreSystem& p, double h) {
  const double y = log_x(p, h), m = m_of(p);
  return p.weight * m * p.n * std::exp(-m * softplus(y) - softplus(-y)) / -h;
}

// Where a function that is above 0 at low and not above 0 at high crosses 0.
template <class Function>
double zero_of(const Function& f, double low, double high) {
  std::uintmax_t iterations = 100;
  const boost::math::tools::eps_tolerance<double> done(45);
  const auto found = boost::math::tools::toms748_solve(f, low, high, done, iterations);
  return 0.5 * (found.first + found.second);
}

void check(const std::vector<PoreSystem>& systems, double l, double h_s) {
  if (systems.empty()) throw std::invalid_argument("at least one pore system is needed");
  double sum = 0.0;
  for (const PoreSystem& p : systems) {
    if (!(p.weight > 0.0)) throw std::invalid_argument("a weight must be above 0");
    if (!(p.alpha > 0.0) || std::isinf(p.alpha))
      throw std::invalid_argument("alpha must be above 0");
    if (!(p.n > 1.0) || std::isinf(p.n)) throw std::invalid_argument("n must be above 1");
    sum += p.weight;
  }
  if (!(std::abs(sum - 1.0) <= 1e-6)) throw std::invalid_argument("the weights must sum to 1");
  if (!(l > -2.0) || std::isinf(l)) throw std::invalid_argument("l must be above -2");
  if (!(h_s <= 0.0) || std::isinf(h_s))
    throw std::invalid_argument("the minimum capillary height must not be above 0");
}

}  // namespace

Durner::Durner(std::vector<PoreSystem> systems, double l, double h_s)
    : systems_(std::move(systems)), l_(l), h_s_(h_s) {
  check(systems_, l, h_s);
  double sum = 0.0;
  for (const PoreSystem& p : systems_) sum += p.weight;
  bracket_s_ = 0.0;
  for (PoreSystem& p : systems_) {
    p.weight /= sum;
    bracket_s_ += p.weight * p.alpha;
  }
  if (h_s < 0.0) {
    retention_s_ = retention(h_s);
    bracket_s_ = bracket(h_s).value;
  }
  steepest_ = switch_head();
}

double Durner::retention(double h) const {
  double sum = 0.0;
  for (const PoreSystem& p : systems_) sum += p.weight * std::exp(-m_of(p) * softplus(log_x(p, h)));
  return sum;
}

double Durner::retention_slope(double h) const {
  double sum = 0.0;
  for (const PoreSystem& p : systems_) sum += weighted_slope(p, h);
  return sum;
}

// B and dB/dh. F' = m n W^m (1 - W) / |h| with W = X / (1 + X).
Durner::Bracket Durner::bracket(double h) const {
  Bracket b{0.0, 0.0};
  for (const PoreSystem& p : systems_) {
    const double y = log_x(p, h), m = m_of(p), scale = p.weight * p.alpha;
    const double log_w_m = -m * softplus(-y);
    b.value += scale * -std::expm1(log_w_m);
    b.slope += scale * m * p.n * std::exp(log_w_m - softplus(y)) / -h;
  }
  return b;
}

double Durner::saturation(double h) const {
  return h < h_s_ ? std::min(retention(h) / retention_s_, 1.0) : 1.0;
}

double Durner::saturation_slope(double h) const {
  return h < h_s_ ? retention_slope(h) / retention_s_ : 0.0;
}

double Durner::relative_conductivity(double h) const {
  if (h >= h_s_) return 1.0;
  const double f = bracket(h).value / bracket_s_;
  return std::min(std::pow(saturation(h), l_) * f * f, 1.0);
}

double Durner::relative_conductivity_slope(double h) const {
  if (h >= h_s_) return 0.0;
  const Bracket b = bracket(h);
  if (b.value == 0.0) return 0.0;  // drier than the range of doubles
  const double Se = saturation(h);
  const double f = b.value / bracket_s_;
  const double per_log = l_ * saturation_slope(h) / Se + 2.0 * b.slope / b.value;
  return std::pow(Se, l_) * f * f * per_log;
}

// d(dSe/dh)/d ln|h|, up to a positive factor: above 0 where the slope grows with suction.
double Durner::slope_growth(double h) const {
  double sum = 0.0;
  for (const PoreSystem& p : systems_) {
    const double w = std::exp(-softplus(-log_x(p, h)));
    sum += weighted_slope(p, h) * (p.n - 1.0 - (2.0 * p.n - 1.0) * w);
  }
  return sum;
}

// Heads of the maxima of dSe/dh, drier ones later. Wetter than the wettest of the systems' own
// maxima every slope grows with suction, drier than the driest every one falls: the maxima of the
// sum lie between. Steps are far finer than any system's hump is wide; a dip narrower than a step
// is no dip to speak of.
std::vector<double> Durner::maxima() const {
  double wet = -1e300, dry = 0.0;
  for (const PoreSystem& p : systems_) {
    wet = std::max(wet, own_steepest_head(p));
    dry = std::min(dry, own_steepest_head(p));
  }
  wet = std::min(wet, h_s_), dry = std::min(dry, h_s_);
  const double start = std::log(-wet), end = std::log(-dry);
  const int steps = static_cast<int>(std::ceil((end - start) / kStep));
  const auto suction = [&](int i) { return start + (end - start) * i / steps; };
  const auto growth = [this](double s) { return slope_growth(-std::exp(s)); };
  std::vector<double> found;
  if (steps == 0 || growth(start) <= 0.0) found.push_back(wet);
  for (int i = 1; i <= steps; ++i) {
    const double low = suction(i - 1), high = suction(i);
    if (growth(low) > 0.0 && growth(high) <= 0.0)
      found.push_back(-std::exp(zero_of(growth, low, high)));
  }
  return found.empty() ? std::vector<double>{dry} : found;  // rounding at the very end
}

// Smallest dSe/d ln|h| between two heads.
double Durner::flattest(double wet, double dry) const {
  double least = std::numeric_limits<double>::infinity();
  const double end = std::log(-dry);
  for (double s = std::log(-wet); s <= end; s += kStep) {
    const double h = -std::exp(s);
    least = std::min(least, retention_slope(h) * -h / retention_s_);
  }
  return least;
}

double Durner::switch_head() const {
  const std::vector<double> all = maxima();
  double best = all.back();
  for (const double h : all)
    if (retention_slope(h) > retention_slope(best) && flattest(h, all.back()) >= kPlateau) best = h;
  return best;
}

std::string Durner::describe() const {
  std::string text = "Durner - Mualem:";
  for (const PoreSystem& p : systems_)
    text += " weight " + parameter_text(p.weight) + ", alpha " + parameter_text(p.alpha) +
            " 1/m, n " + parameter_text(p.n) + ";";
  return text + " l " + parameter_text(l_) + ", minimum capillary height " + parameter_text(h_s_) +
         " m";
}

}  // namespace ringwright::models
