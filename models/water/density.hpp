#pragma once

namespace ringwright::models {

/// Density of air-free water at 0.1 MPa.
///   rho = 999.974950 [1 - (t - 3.983035)^2 (t + 301.797) / (522528.9 (t + 69.34881))] kg/m3
/// @param temperature t [degC], from 0 to 40 (the range of the formula)
/// @return [kg/m3]
/// @throws std::invalid_argument outside the range
/// @source Tanaka, Girard, Davis, Peuto & Bignell 2001, Metrologia 38:301
/// @checked tests/models/water/density_test.cpp
double water_density(double temperature);

/// Expansion of water with temperature, -(d rho/dt) / rho, of the same formula [1/K]; below 0
/// under 4 degC.
/// @param temperature [degC], from 0 to 40 @throws std::invalid_argument outside the range
double water_expansion(double temperature);

/// Standard gravity [m/s2].
inline constexpr double standard_gravity = 9.80665;

/// Weight of water at 20 degC per volume, rho g [N/m3].
double water_weight_at_20();

}  // namespace ringwright::models
