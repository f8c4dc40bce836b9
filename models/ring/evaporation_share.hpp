#pragma once

namespace ringwright::models {

/// What evaporation adds to the fall of an open pond, over what the soil takes: E / i [-].
/// @param evaporation E from the water surface [m/s], >= 0
/// @param rate i into the soil [m/s], >= 0; none of either: 0
/// @return infinity where nothing goes into the soil
/// @throws std::invalid_argument for a value below 0
/// @checked tests/models/ring/evaporation_share_test.cpp
double evaporation_share(double evaporation, double rate);

/// Above this an open ring does not show the soil (common practice, no source) [-].
inline constexpr double largest_evaporation_share = 0.10;

}  // namespace ringwright::models
