#pragma once
/// Look-up table of a soil's curves in the solver's own unknown.
///
/// Why a table: the flow equation needs Se, Kr and the flux potential
/// Phi(h) = integral of Kr for every cell in every Newton iteration, and the closed
/// forms cost some twenty times a cubic.
///
/// Why another unknown: Newton's method in h creeps in dry soil (Se hardly changes
/// over metres of suction) and in Se it fails at saturation (Se does not change at
/// all). So the unknown u is h where the soil is wetter than the head h* at which
/// dSe/dh is largest, and affine in Se where it is drier, with slope and value
/// continued:
///
///   u = h                                   for h >= h*
///   u = h* + (Se - Se(h*)) / Se'(h*)        for h <  h*
///
/// Both branches are piecewise cubic (Hermite) with bins taken from the leading bits
/// of Se (dry) or -h (wet), so that bins are fine where the curves are steep on a
/// logarithmic scale. The number of bins per octave is doubled until the value in the
/// middle of every bin is right to `1e-6`. Bins end exactly at h* and at the entry
/// head; nothing straddles a kink.
///
/// A table is immutable and depends on the curve alone (not on Ks, theta_r, theta_s):
/// share it between runs and threads.

#include <algorithm>
#include <bit>
#include <cstdint>
#include <memory>
#include <vector>

#include "models/soil/curves.hpp"

namespace ringwright::solver {

/// Values and slopes with respect to u [m].
struct CurvePoint {
  double Se, dSe;    ///< effective saturation [-], [1/m]
  double Phi, dPhi;  ///< relative flux potential [m], [-]
  double K, dK;      ///< relative conductivity [-], [1/m]
};

/// What a cell gives to a face, its flux potential and the gravity flow it drives, over Ks and
/// transmissibility [m]; never below 0, so that a cell without water gives none (flow_system.hpp).
/// @param rise weighted height of the cell over the far side [m], negative: below it
inline double pushed(const CurvePoint& p, double rise) { return std::max(p.Phi + p.K * rise, 0.0); }
inline double pushed_slope(const CurvePoint& p, double rise) {
  return p.Phi + p.K * rise > 0.0 ? p.dPhi + p.dK * rise : 0.0;
}

class CurveTable {
 public:
  explicit CurveTable(std::shared_ptr<const models::Curves> curves);

  /// All curves at u [m]; u above driest().
  CurvePoint at(double u) const {
    if (u >= entry_) return {1.0, 0.0, entry_potential_ + (u - entry_), 1.0, 1.0, 0.0};
    return u < switch_ ? dry_point(u) : wet_point(u);
  }

  /// All curves at pressure head h [m]; slopes with respect to h.
  CurvePoint at_head(double h) const {
    if (h >= switch_) return at(h);
    CurvePoint p = at(u_of_head(h));
    const double du_dh = p.K / p.dPhi;  // since dPhi/dh = K
    p.dSe *= du_dh, p.dK *= du_dh, p.dPhi = p.K;
    return p;
  }

  double u_of_head(double h) const;
  double u_of_saturation(double Se) const { return switch_ + (Se - switch_saturation_) / slope_; }
  double head_of_u(double u) const;
  /// u at which the flux potential is Phi [m], Phi > 0.
  double u_of_potential(double Phi) const;
  /// Relative flux potential at pressure head h [m].
  double potential_of_head(double h) const { return at(u_of_head(h)).Phi; }

  double driest() const { return switch_ - switch_saturation_ / slope_; }  ///< u where Se = 0 [m]
  double switch_point() const { return switch_; }                          ///< u = h* [m]
  double entry() const { return entry_; }                                  ///< entry head [m]
  double capillary_length() const { return entry_potential_ - entry_; }  ///< from dry to h = 0 [m]
  int bins() const { return static_cast<int>(dry_.size() + wet_.size()); }
  const models::Curves& curves() const { return *curves_; }

 private:
  struct Bin {
    double x0;
    double Phi[4], K[4], Se[4];  // cubic coefficients in x - x0; Se unused when dry
  };
  struct Node {
    double x, Se, dSe, Phi, dPhi, K, dK;  // slopes with respect to x
  };
  struct Branch {
    int shift = 0;
    std::int64_t first = 0;
  };

  static double cubic(const double c[4], double t) {
    return c[0] + t * (c[1] + t * (c[2] + t * c[3]));
  }
  static double cubic_slope(const double c[4], double t) {
    return c[1] + t * (2 * c[2] + t * 3 * c[3]);
  }
  static std::int64_t key(double x, int shift) {
    return static_cast<std::int64_t>(std::bit_cast<std::uint64_t>(x) >> shift);
  }
  // In the header: at() is called for every cell in every iteration.
  CurvePoint dry_point(double u) const {
    const double x = std::min(switch_saturation_ + (u - switch_) * slope_, switch_saturation_);
    if (x < driest_tabled_) return beyond_table(std::max(x, 1e-300));
    const auto i = std::min<std::int64_t>(key(x, dry_branch_.shift) - dry_branch_.first,
                                          static_cast<std::int64_t>(dry_.size()) - 1);
    const Bin& b = dry_[static_cast<std::size_t>(i)];
    const double t = x - b.x0;
    return {x,
            slope_,
            cubic(b.Phi, t),
            cubic_slope(b.Phi, t) * slope_,
            cubic(b.K, t),
            cubic_slope(b.K, t) * slope_};
  }
  CurvePoint wet_point(double u) const {
    const double x = std::max(-u, 0.0);
    const auto i = std::clamp<std::int64_t>(key(x, wet_branch_.shift) - wet_branch_.first, 0,
                                            static_cast<std::int64_t>(wet_.size()) - 1);
    const Bin& b = wet_[static_cast<std::size_t>(i)];
    const double t = x - b.x0;
    return {cubic(b.Se, t),         -cubic_slope(b.Se, t), cubic(b.Phi, t),
            -cubic_slope(b.Phi, t), cubic(b.K, t),         -cubic_slope(b.K, t)};
  }
  CurvePoint beyond_table(double Se) const;
  void build_dry();
  void build_wet();
  Node node(double x, bool dry) const;
  void integrate_potential(std::vector<Node>& nodes, bool dry) const;
  double worst_middle_error(const std::vector<Node>& nodes, bool dry) const;
  static std::vector<Bin> bins_of(const std::vector<Node>& nodes);
  static std::vector<double> edges(double from, double to, int bits, Branch& branch);
  double head_of_x(double x, bool dry) const;

  std::shared_ptr<const models::Curves> curves_;
  double switch_ = 0.0, switch_saturation_ = 0.0, slope_ = 0.0;
  double entry_ = 0.0, entry_potential_ = 0.0, switch_potential_ = 0.0;
  double driest_tabled_ = 0.0;
  // Drier than the table K and Phi go on as powers of Se, continued in value and slope.
  double driest_K_ = 0.0, driest_Phi_ = 0.0, power_K_ = 0.0, power_Phi_ = 0.0;
  std::vector<Bin> dry_, wet_;
  Branch dry_branch_, wet_branch_;
};

}  // namespace ringwright::solver
