#pragma once
/// Kfs from the steady rate of a single ring at one head, with an assumed alpha*:
///
///   i / Kfs = 1 + H / (pi a G) + 1 / (alpha* pi a G),   G = 0.316 d/a + 0.184
///
/// i rate, H pond depth, a radius, d insertion, alpha* = 1 / capillary length. G is one line put
/// through computed values: it does not know the soil nor the head, and fails for a vanishing
/// head over a driven-in ring.
///
/// @source Reynolds & Elrick 1990, Soil Sci. Soc. Am. J. 54:1233 (equation from memory, its
///   algebra checked)
/// @checked tests/models/estimators/reynolds_elrick_single_head_test.cpp

#include <span>
#include <vector>

#include "models/estimators/published_range.hpp"

namespace ringwright::models {

/// Shape factor G [-]. @param insertion_over_radius d/a [-], >= 0
double reynolds_elrick_shape(double insertion_over_radius);

/// @param alpha_star assumed [1/m], > 0
/// @return Kfs [m/s], at the temperature of the rate
/// @throws std::invalid_argument for a rate, head or insertion below 0, a radius or alpha* not
///   above 0
double reynolds_elrick_single_head(const SteadyRing& test, double alpha_star);

/// Head, insertion, insertion over radius, radius and alpha* the formula was stated for (from
/// memory).
std::span<const PublishedLimit> reynolds_elrick_limits();

/// What of a test lies outside these limits; the formula gives a number all the same.
std::vector<LimitBroken> reynolds_elrick_limits_broken(const SteadyRing& test, double alpha_star);

}  // namespace ringwright::models
