#pragma once

namespace ringwright::models {

/// Surface tension of water against its vapour or air.
///   sigma = 0.2358 tau^1.256 (1 - 0.625 tau) N/m,  tau = 1 - T_K / 647.096 K
/// @param temperature [degC], from -25 to 100
/// @return [N/m]
/// @throws std::invalid_argument outside the range
/// @source IAPWS R1-76(2014), release on the surface tension of ordinary water substance
///   (coefficients from memory)
/// @checked tests/models/water/surface_tension_test.cpp
double water_surface_tension(double temperature);

}  // namespace ringwright::models
