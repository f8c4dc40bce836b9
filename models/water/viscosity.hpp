#pragma once

namespace ringwright::models {

/// Dynamic viscosity of liquid water at 0.1 MPa.
///   mu [uPa s] = 280.68 T^-1.9 + 511.45 T^-7.7 + 61.131 T^-19.6 + 0.45903 T^-40,  T = T_K / 300 K
/// @param temperature [degC], from -20 to 110 (the range of the formula)
/// @return [Pa s]
/// @throws std::invalid_argument outside the range
/// @source IAPWS, supplementary release on properties of liquid water at 0.1 MPa, 2008 (from
///   memory)
/// @checked tests/models/water/viscosity_test.cpp
double water_viscosity(double temperature);

/// mu(temperature) / mu(20 degC); a conductivity at 20 degC is that at `temperature` times it [-].
/// @param temperature [degC]
double viscosity_ratio(double temperature);

}  // namespace ringwright::models
