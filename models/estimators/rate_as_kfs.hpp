#pragma once
#include "models/estimators/published_range.hpp"

namespace ringwright::models {

/// The steady rate itself taken as Kfs:  Kfs = i_s.
///
/// Right for one-dimensional flow under unit gradient only. A single ring also drives water
/// sideways by its head and by capillarity: the figure is then too high by
/// 1 + (H + lambda) / (pi a G), typically 1.5 to 4 times. No range was published for it.
/// @return [m/s] @throws std::invalid_argument if the rate is below 0
/// @source common practice, no source
/// @checked tests/models/estimators/rate_as_kfs_test.cpp
double rate_as_kfs(const SteadyRing& test);

}  // namespace ringwright::models
