#pragma once
/// Correction of the two-point flux at the foot of a thin wall.
///
/// Near the foot the potential behaves like the harmonic function
///
///   U = Im sqrt(w) = sqrt(rho) sin(phi / 2),   w = rho exp(i phi),
///
/// rho the distance from the foot, phi the angle from the prolongation of the wall (no flow
/// through the wall, phi = +-pi). Its gradient is infinite at the foot and a two-point flux
/// across the three open faces that meet there is too small by a third, on every mesh. The
/// transmissibility of such a face is multiplied by the ratio of the exact flux of U through
/// it, which is the difference of Re sqrt(w) between its ends, to the two-point flux at the
/// centres actually used (1.5537 for square cells). With d = 0 the same is done at the edge
/// where the pond ends on a closed surface: phi is then counted from the ponded surface.
///
/// Where another material begins at the level of the foot (K1 above, K2 below), the function is
///
///   U = rho^s sin(s phi) below,   tan(s pi/2) rho^s cos(s (pi - phi)) above,
///   tan^2(s pi/2) = K2 / K1,
///
/// which has equal potential and equal vertical flow on both sides (phi = pi/2). In soil whose
/// horizontal conductivity is k times the vertical all this holds in x / sqrt(k), and K1, K2 are
/// the geometric means of the two conductivities.
///
/// Source: separation of variables of Laplace's equation in a plane wedge (textbook);
/// gravity and curvature are of higher order at the foot.

#include <complex>

namespace ringwright::solver {

/// A point about the foot; the real axis is where U = 0 (prolongation of the wall, or the
/// ponded surface for d = 0).
using TipPoint = std::complex<double>;

/// Factor for the face from p to q between the cells with centres a and b, in one isotropic soil.
double tip_factor(TipPoint p, TipPoint q, TipPoint a, TipPoint b);

/// The materials above and below the level of the foot.
struct TipGround {
  double contrast = 1.0;       ///< vertical conductivity above over that below [-]
  double stretch_above = 1.0;  ///< square root of horizontal over vertical conductivity [-]
  double stretch_below = 1.0;

  bool one_isotropic_soil() const {
    return contrast == 1.0 && stretch_above == 1.0 && stretch_below == 1.0;
  }
};

/// The potential about the foot of a wall where two materials may meet, and the factors of the
/// three faces there. Points are not stretched: depth below the foot, distance from the wall.
class TipField {
 public:
  explicit TipField(const TipGround& ground);

  double exponent() const { return s_; }
  double potential(TipPoint at) const;
  /// Factor of the face below the foot, of the length given, between centres on its two sides.
  double factor_below(double length, TipPoint a, TipPoint b) const;
  /// Factor of the face beside the foot, of the length given, from a centre above to one below.
  double factor_beside(double length, TipPoint above, TipPoint below) const;

 private:
  TipGround ground_;
  double s_ = 0.5;
};

}  // namespace ringwright::solver
