#include "solver/flow/curve_table.hpp"

#include <algorithm>
#include <bit>
#include <cmath>

namespace ringwright::solver {
namespace {

constexpr double kDriestHead = -1000.0;  // [m]; drier is a power law
constexpr double kSmallestSaturation = 1e-8;
constexpr double kMiddleError = 1e-6;
constexpr int kSmallestBits = 3, kLargestBits = 11;
// With an entry head of 0 the slope of Kr may be infinite there; the last stretch is a chord.
constexpr double kLastStretch = 1e-4;  // [m]

void hermite(double c[4], double width, double f0, double d0, double f1, double d1) {
  const double secant = (f1 - f0) / width;
  c[0] = f0;
  c[1] = d0;
  c[2] = (3 * secant - 2 * d0 - d1) / width;
  c[3] = (d0 + d1 - 2 * secant) / (width * width);
}

// Gauss-Legendre, 5 points on [-1, 1] (Abramowitz & Stegun 1964, table 25.4).
constexpr double kGaussX[5] = {-0.906179845938664, -0.538469310105683, 0.0, 0.538469310105683,
                               0.906179845938664};
constexpr double kGaussW[5] = {0.236926885056189, 0.478628670499366, 0.568888888888889,
                               0.478628670499366, 0.236926885056189};

double integral_of_conductivity(const models::Curves& curves, double from, double to) {
  double sum = 0.0;
  for (int i = 0; i < 5; ++i)
    sum += kGaussW[i] *
           curves.relative_conductivity(0.5 * (from + to) + 0.5 * (to - from) * kGaussX[i]);
  return 0.5 * (to - from) * sum;
}

double just_below(double h) { return std::nextafter(h, -1e30) - 1e-13 * std::abs(h); }

}  // namespace

CurveTable::CurveTable(std::shared_ptr<const models::Curves> curves) : curves_(std::move(curves)) {
  entry_ = curves_->entry_head();
  switch_ = std::min(curves_->steepest_head(), entry_);
  const double h = switch_ < entry_ ? switch_ : just_below(entry_);
  switch_saturation_ = switch_ < entry_ ? curves_->saturation(switch_) : 1.0;
  slope_ = curves_->saturation_slope(h);
  build_dry();
  build_wet();
}

double CurveTable::head_of_x(double x, bool dry) const {
  if (!dry) return -x;
  return x >= switch_saturation_ ? switch_ : curves_->head_at(x);
}

CurveTable::Node CurveTable::node(double x, bool dry) const {
  const double h = head_of_x(x, dry);
  const double below = h < entry_ ? h : just_below(entry_);
  Node n{};
  n.x = x;
  n.Se = dry ? x : curves_->saturation(h);
  n.K = curves_->relative_conductivity(h);
  const double dSe = curves_->saturation_slope(below);
  const double dK = curves_->relative_conductivity_slope(below);
  n.dSe = dry ? 1.0 : -dSe;
  n.dK = dry ? dK / dSe : -dK;
  n.dPhi = dry ? n.K / dSe : -n.K;
  return n;
}

std::vector<double> CurveTable::edges(double from, double to, int bits, Branch& branch) {
  branch.shift = 52 - bits;
  branch.first = key(from, branch.shift);
  std::vector<double> x{from};
  for (std::int64_t k = branch.first + 1;; ++k) {
    const double edge = std::bit_cast<double>(static_cast<std::uint64_t>(k) << branch.shift);
    if (edge >= to) break;
    x.push_back(edge);
  }
  x.push_back(to);
  return x;
}

void CurveTable::integrate_potential(std::vector<Node>& nodes, bool dry) const {
  if (dry) {
    nodes.front().Phi = curves_->relative_flux_potential(head_of_x(nodes.front().x, true));
    for (std::size_t i = 1; i < nodes.size(); ++i)
      nodes[i].Phi =
          nodes[i - 1].Phi + integral_of_conductivity(*curves_, head_of_x(nodes[i - 1].x, true),
                                                      head_of_x(nodes[i].x, true));
    return;
  }
  nodes.back().Phi = switch_potential_;
  for (std::size_t i = nodes.size() - 1; i > 0; --i)
    nodes[i - 1].Phi =
        nodes[i].Phi + integral_of_conductivity(*curves_, -nodes[i].x, -nodes[i - 1].x);
}

double CurveTable::worst_middle_error(const std::vector<Node>& nodes, bool dry) const {
  double worst = 0.0;
  for (std::size_t i = 1; i < nodes.size(); ++i) {
    const Node &l = nodes[i - 1], &r = nodes[i];
    const double w = r.x - l.x;
    const double h = head_of_x(0.5 * (l.x + r.x), dry);
    const double K = curves_->relative_conductivity(h);
    const double K_mid = 0.5 * (l.K + r.K) + w / 8 * (l.dK - r.dK);
    worst = std::max(worst, std::abs(K_mid - K) / K);
    if (dry) continue;
    const double Se = curves_->saturation(h);
    const double Se_mid = 0.5 * (l.Se + r.Se) + w / 8 * (l.dSe - r.dSe);
    worst = std::max(worst, std::abs(Se_mid - Se));
  }
  return worst;
}

std::vector<CurveTable::Bin> CurveTable::bins_of(const std::vector<Node>& nodes) {
  std::vector<Bin> bins(nodes.size() - 1);
  for (std::size_t i = 0; i + 1 < nodes.size(); ++i) {
    const Node &l = nodes[i], &r = nodes[i + 1];
    const double w = r.x - l.x;
    bins[i].x0 = l.x;
    hermite(bins[i].Se, w, l.Se, l.dSe, r.Se, r.dSe);
    hermite(bins[i].Phi, w, l.Phi, l.dPhi, r.Phi, r.dPhi);
    hermite(bins[i].K, w, l.K, l.dK, r.K, r.dK);
  }
  return bins;
}

void CurveTable::build_dry() {
  driest_tabled_ =
      std::max(curves_->saturation(std::min(kDriestHead, 50 * switch_)), kSmallestSaturation);
  std::vector<Node> nodes;
  for (int bits = kSmallestBits; bits <= kLargestBits; ++bits) {
    nodes.clear();
    for (double x : edges(driest_tabled_, switch_saturation_, bits, dry_branch_))
      nodes.push_back(node(x, true));
    if (worst_middle_error(nodes, true) < kMiddleError) break;
  }
  integrate_potential(nodes, true);
  dry_ = bins_of(nodes);
  const Node& driest = nodes.front();
  driest_K_ = driest.K, driest_Phi_ = driest.Phi;
  power_K_ = driest.x * driest.dK / driest.K;
  power_Phi_ = driest.x * driest.dPhi / driest.Phi;
  switch_potential_ = nodes.back().Phi;
  entry_potential_ = switch_potential_;
}

void CurveTable::build_wet() {
  if (switch_ >= entry_) return;
  const double nearest = std::max(-entry_, std::min(kLastStretch, -0.01 * switch_));
  std::vector<Node> nodes;
  for (int bits = kSmallestBits; bits <= kLargestBits; ++bits) {
    nodes.clear();
    for (double x : edges(nearest, -switch_, bits, wet_branch_)) nodes.push_back(node(x, false));
    if (worst_middle_error(nodes, false) < kMiddleError) break;
  }
  integrate_potential(nodes, false);
  wet_ = bins_of(nodes);
  entry_potential_ = nodes.front().Phi;
  if (nearest > -entry_) {  // chord from the last node to saturation at h = 0
    const Node& l = nodes.front();
    entry_potential_ += 0.5 * (1.0 + l.K) * nearest;
    Bin chord{};
    chord.x0 = 0.0;
    chord.Se[0] = chord.K[0] = 1.0;
    chord.Se[1] = (l.Se - 1.0) / nearest;
    chord.K[1] = (l.K - 1.0) / nearest;
    chord.Phi[0] = entry_potential_;
    chord.Phi[1] = -1.0;
    chord.Phi[2] = -0.5 * chord.K[1];
    wet_.insert(wet_.begin(), chord);
    wet_branch_.first -= 1;
  }
}

CurvePoint CurveTable::beyond_table(double Se) const {
  const double r = Se / driest_tabled_;
  const double K = driest_K_ * std::pow(r, power_K_);
  const double Phi = driest_Phi_ * std::pow(r, power_Phi_);
  return {Se, slope_, Phi, power_Phi_ * Phi / Se * slope_, K, power_K_ * K / Se * slope_};
}

double CurveTable::u_of_head(double h) const {
  return h >= switch_ ? h : u_of_saturation(curves_->saturation(h));
}

double CurveTable::head_of_u(double u) const {
  if (u >= switch_) return u;
  const double Se = switch_saturation_ + (u - switch_) * slope_;
  return curves_->head_at(std::clamp(Se, 1e-300, 1.0));
}

double CurveTable::u_of_potential(double Phi) const {
  if (std::isnan(Phi)) return Phi;  // no bin is its own
  if (Phi >= entry_potential_) return entry_ + (Phi - entry_potential_);
  const bool dry = Phi < switch_potential_;
  const std::vector<Bin>& bins = dry ? dry_ : wet_;
  if (dry && Phi <= driest_Phi_)
    return u_of_saturation(driest_tabled_ *
                           std::pow(std::max(Phi, 0.0) / driest_Phi_, 1.0 / power_Phi_));
  const auto it = dry ? std::upper_bound(bins.begin(), bins.end(), Phi,
                                         [](double p, const Bin& b) { return p < b.Phi[0]; })
                      : std::upper_bound(bins.begin(), bins.end(), Phi,
                                         [](double p, const Bin& b) { return p > b.Phi[0]; });
  const auto next = it;
  const Bin& b = *std::prev(it);
  const double x_end = next != bins.end() ? next->x0 : (dry ? switch_saturation_ : -switch_);
  double low = b.x0, high = x_end;
  const double sign = dry ? 1.0 : -1.0;
  double x = 0.5 * (low + high);
  for (int i = 0; i < 60; ++i) {
    const double f = cubic(b.Phi, x - b.x0) - Phi;
    (sign * f > 0 ? high : low) = x;
    double step = x - f / cubic_slope(b.Phi, x - b.x0);
    if (!(step > low && step < high)) step = 0.5 * (low + high);
    if (std::abs(step - x) <= 1e-14 * (std::abs(x) + x_end))
      return dry ? u_of_saturation(step) : -step;
    x = step;
  }
  return dry ? u_of_saturation(x) : -x;
}

}  // namespace ringwright::solver
