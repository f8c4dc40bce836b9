#pragma once
/// Sorptivity S [m/s^1/2] of a soil: without gravity, I = S sqrt(t) from a start at the uniform
/// head h_i and a pond of depth H. theta_i = theta(h_i), dtheta = theta_s - theta_i, h_s the
/// entry head, which with H adds a saturated zone.
///
/// Both forms integrate over h: over theta the diffusivity is infinite at saturation.
///
/// @checked tests/models/soil/sorptivity_test.cpp

#include "models/soil/curves.hpp"

namespace ringwright::models {

/// Parlange's estimate, mostly 1 % low:
///   S^2 = integral from h_i to h_s of (theta_s + theta - 2 theta_i) K dh
///         + 2 Ks (H - h_s) dtheta
/// @param h_i initial head [m], below the entry head @param H depth of the pond [m], >= 0
/// @throws std::invalid_argument otherwise
/// @source Parlange 1975, Soil Sci. 119:158
double parlange_sorptivity(const Soil& soil, double h_i, double H = 0.0);

/// The exact one, to about 1e-6. With F(theta) the flow at theta over that at the surface,
/// Boltzmann's transformation gives
///   F'' = -2 D / (S^2 F),  F(theta_i) = 0,  F(theta_s) = 1,  F'(theta_s) = 2 Ks (H - h_s) / S^2,
/// which is integrated twice from the surface and iterated from Parlange's F; S^2 follows from
/// F(theta_i) = 0.
/// @throws as parlange_sorptivity; std::runtime_error if the iteration does not settle
/// @source Philip & Knight 1974, Soil Sci. 117:1 (flux-concentration relation; from memory)
double sorptivity(const Soil& soil, double h_i, double H = 0.0);

}  // namespace ringwright::models
