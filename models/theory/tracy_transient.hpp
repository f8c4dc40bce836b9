#pragma once
/// Exact transient flow in two dimensions in a linear (Gardner) soil, planar or axisymmetric.
///
/// A box 0 <= x <= a (or a cylinder 0 <= r <= R) of height L, z up from its bottom, starts at
/// h_r and keeps h_r at bottom and sides (r = R); at the top, from t = 0 on,
///
///   exp(alpha h) = exp(alpha h_r) + (1 - exp(alpha h_r)) s,   s = sin(pi x/a)  or  J0(k1 r)
///
/// With hbar = exp(alpha h) - exp(alpha h_r), c = alpha (theta_s - theta_r)/Ks,
/// b^2 = alpha^2/4 + (pi/a)^2 (or + k1^2, k1 = 2.4048.../R), l_k = k pi/L, g_k = (b^2 + l_k^2)/c:
///
///   hbar = (1 - exp(alpha h_r)) s exp(alpha (L - z)/2) { sinh(b z)/sinh(b L)
///          + 2/(L c) sum over k >= 1 of (-1)^k (l_k/g_k) sin(l_k z) exp(-g_k t) }
///
/// The series is summed until its terms vanish in double precision: at very short times that takes
/// many terms, about L / (pi sqrt(t/(37 c))).
///
/// @source Tracy 2006, Water Resour. Res. 42:W08503 (from memory; residual, initial and boundary
///   conditions checked); the axisymmetric form is derived here by the same separation
/// @checked tests/models/theory/tracy_transient_test.cpp

namespace ringwright::models {

struct TracyProblem {
  double Ks = 0.0;             ///< [m/s], > 0
  double alpha = 0.0;          ///< [1/m], > 0
  double content_range = 0.0;  ///< theta_s - theta_r [-], > 0
  double h_r = 0.0;            ///< head at start, bottom and sides [m], < 0
  double width = 0.0;          ///< a of the box, or radius R of the cylinder [m], > 0
  double height = 0.0;         ///< L [m], > 0
};

/// Pressure head [m] at (x, z) [m] in the box at t [s], >= 0.
/// @throws std::invalid_argument for a problem or time out of range
double tracy_planar_head(const TracyProblem& problem, double x, double z, double t);

/// Pressure head [m] at (r, z) [m] in the cylinder at t [s], >= 0. @throws as the planar one
double tracy_axisymmetric_head(const TracyProblem& problem, double r, double z, double t);

}  // namespace ringwright::models
