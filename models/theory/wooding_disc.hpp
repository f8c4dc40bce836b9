#pragma once

namespace ringwright::models {

/// Steady flow from a disc at h = 0 into a dry half space of Gardner soil, Wooding's
/// approximation:  Q = pi a^2 Ks + 4 a Ks/alpha.
///
/// Below the exact flow by up to 6 % (near alpha a = 0.5): no solver can be certified with it.
/// @param Ks [m/s] @param alpha [1/m] @param radius a [m] @return [m3/s]
/// @source Wooding 1968, Water Resour. Res. 4:1259
/// @checked tests/models/theory/wooding_disc_test.cpp
double wooding_disc_flow(double Ks, double alpha, double radius);

}  // namespace ringwright::models
