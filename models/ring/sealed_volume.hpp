#pragma once

namespace ringwright::models {

/// Change of a closed volume of water per degree: what a sealed ring gives to or takes from its
/// bag when only the temperature changes. Expansion of the ring itself (about a sixth of the
/// water's in steel) and of trapped air (far more) is left out.
/// @param volume of water in the closed ring [m3], >= 0
/// @param temperature of the water [degC], 0 to 40
/// @return [m3/K]; below 0 under 4 degC
/// @throws std::invalid_argument for values out of range
/// @source water_expansion(), Tanaka et al. 2001, Metrologia 38:301
/// @checked tests/models/ring/sealed_volume_test.cpp
double sealed_volume_per_degree(double volume, double temperature);

/// Swing of temperature between two readings that makes an error of `share` in the volume read [K].
/// @param flow into the ground [m3/s], > 0 @param interval between the readings [s], > 0
/// @param share of that volume [-], > 0
/// @return infinity where the water does not expand
double allowable_temperature_swing(double volume, double temperature, double flow, double interval,
                                   double share);

}  // namespace ringwright::models
