#include "models/soil/sorptivity.hpp"

#include <algorithm>
#include <cmath>
#include <stdexcept>
#include <vector>

namespace ringwright::models {
namespace {

constexpr int kCells = 8000;

// Cells between the wet end and h_i, graded in ln|h|. Index 0 is the wettest edge.
// w = (Se - Se_i) / (1 - Se_i) runs from 1 to 0.
struct Profile {
  double wet_head = 0.0;    // where the cells begin [m]; wetter is saturated
  double rise = 0.0;        // 1 - Se_i
  std::vector<double> w;    // at edges
  std::vector<double> Kdh;  // integral of Kr over a cell [m]
};

void check(const Soil& soil, double h_i, double H) {
  if (!(h_i < soil.curves->entry_head()) || !(soil.curves->saturation(h_i) < 1.0)) {
    throw std::invalid_argument("a sorptivity needs an unsaturated start");
  }
  if (!(H >= 0.0)) throw std::invalid_argument("the depth of a pond must not be below 0");
}

Profile profile(const Curves& curves, double h_i) {
  Profile p;
  // A soil without entry head counts as saturated above a suction too small to matter.
  p.wet_head =
      std::min(curves.entry_head(), 1e-8 * std::max(h_i, std::min(curves.steepest_head(), -1e-3)));
  const double Se_i = curves.saturation(h_i);
  p.rise = 1.0 - Se_i;
  const double range = std::log(h_i / p.wet_head);
  // Finer towards h_i, where F vanishes.
  const auto head = [&](double cells) {
    const double left = 1.0 - cells / kCells;
    return p.wet_head * std::exp(range * (1.0 - left * left));
  };
  p.w.resize(kCells + 1);
  p.Kdh.resize(kCells);
  for (int i = 0; i <= kCells; ++i) {
    const double h = i == kCells ? h_i : head(i);
    p.w[i] = i == 0 ? 1.0 : (curves.saturation(h) - Se_i) / p.rise;
    if (i == kCells) break;
    const double next = head(i + 1);
    p.Kdh[i] = curves.relative_conductivity(head(i + 0.5)) * (h - next);
  }
  return p;
}

// S^2 / (Ks dtheta), given F in the middle of the cells.
// N(w) = integral from w to 1 of M,  M(w) = integral of Kr/F dh from w to the surface + pond term.
double squared(const Profile& p, const std::vector<double>& F, double saturated_head,
               std::vector<double>& N) {
  double M = saturated_head;
  N.assign(kCells + 1, 0.0);
  for (int i = 0; i < kCells; ++i) {
    const double gain = p.Kdh[i] / F[i];
    N[i + 1] = N[i] + (M + 0.5 * gain) * (p.w[i] - p.w[i + 1]);
    M += gain;
  }
  return 2.0 * N.back();
}

std::vector<double> parlange_flow(const Profile& p) {
  std::vector<double> F(kCells);
  for (int i = 0; i < kCells; ++i) {
    const double w = 0.5 * (p.w[i] + p.w[i + 1]);
    F[i] = 2.0 * w / (1.0 + w);
  }
  return F;
}

}  // namespace

double parlange_sorptivity(const Soil& soil, double h_i, double H) {
  check(soil, h_i, H);
  const Profile p = profile(*soil.curves, h_i);
  double sum = 2.0 * (H - p.wet_head);
  for (int i = 0; i < kCells; ++i) {
    sum += (1.0 + 0.5 * (p.w[i] + p.w[i + 1])) * p.Kdh[i];
  }
  const double dtheta = (soil.theta_s - soil.theta_r) * p.rise;
  return std::sqrt(soil.Ks * dtheta * sum);
}

double sorptivity(const Soil& soil, double h_i, double H) {
  check(soil, h_i, H);
  constexpr int most_rounds = 500;
  constexpr double settled = 1e-10;
  const Profile p = profile(*soil.curves, h_i);
  const double dtheta = (soil.theta_s - soil.theta_r) * p.rise;
  std::vector<double> F = parlange_flow(p);
  std::vector<double> N;
  double last = 0.0;
  for (int round = 0; round < most_rounds; ++round) {
    const double now = squared(p, F, H - p.wet_head, N);
    if (std::abs(now - last) <= settled * now) return std::sqrt(soil.Ks * dtheta * now);
    last = now;
    for (int i = 0; i < kCells; ++i) F[i] = 1.0 - 0.5 * (N[i] + N[i + 1]) / N.back();
  }
  throw std::runtime_error("the iteration for the sorptivity did not settle");
}

}  // namespace ringwright::models
