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
/// Source: separation of variables of Laplace's equation in a plane wedge (textbook);
/// gravity and curvature are of higher order at the foot.

#include <complex>

namespace ringwright::solver {

/// A point about the foot; the real axis is where U = 0 (prolongation of the wall, or the
/// ponded surface for d = 0).
using TipPoint = std::complex<double>;

/// Factor for the face from p to q between the cells with centres a and b.
double tip_factor(TipPoint p, TipPoint q, TipPoint a, TipPoint b);

}  // namespace ringwright::solver
