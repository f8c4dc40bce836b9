#pragma once
/// How much ground a test needs around it.

#include "solver/virtual_test.hpp"

namespace ringwright::solver {

struct Domain {
  double radius = 0.0;  ///< [m]
  double depth = 0.0;   ///< [m]
};

/// Depth that one-dimensional infiltration wets in time t [m], an upper estimate:
/// S sqrt(t) + Ks t over the fillable content, S^2 = 2 Ks dtheta (H + lambda)
/// (Green & Ampt 1911 in the form of Philip 1957). In the uppermost soil, under the
/// first head.
double wetted_depth_estimate(const TestSetup& setup, double capillary_length, double t);

/// Domain of the transient test: four times what gravity and capillarity can wet, below
/// the wall and (without gravity) beside it; the widest of the layers that are reached counts.
/// With a water table it is as deep as the steady one and at least as wide.
/// @param capillary_length of the uppermost soil [m]
Domain transient_domain(const TestSetup& setup, double capillary_length);

/// Domain of the steady state, whose far field decays slowly in fine soil: the flow is
/// within 0.1 % of that of the unbounded ground.
Domain steady_domain(const models::SingleRing& ring, double capillary_length);

/// The same for any ground: the largest ring, the longest capillary length. Where there is a water
/// table, wide and deep enough below it that the water spreads freely in the saturated ground.
Domain steady_domain(const TestSetup& setup, double capillary_length);

/// Largest head [m] that the program of either ring sets.
double largest_head(const TestSetup& setup);

}  // namespace ringwright::solver
