#pragma once

namespace ringwright::models {

inline constexpr double steel_density = 7850.0;      ///< [kg/m3], textbook
inline constexpr double aluminium_density = 2700.0;  ///< [kg/m3], textbook

/// Mass of an open ring, density times pi ((a + s)^2 - a^2) height.
/// @param radius inner radius a [m] @param wall thickness s [m] @param height [m], all > 0
/// @param density of the wall [kg/m3]
/// @return [kg]
/// @throws std::invalid_argument for a value not above 0
/// @checked tests/models/ring/ring_mass_test.cpp
double ring_mass(double radius, double wall, double height, double density = steel_density);

}  // namespace ringwright::models
