#pragma once
/// A level that falls over a soil with a sharp wetting front, while the front is inside the ring.
///
/// The ring (area A) is fed from a vessel of free area A/R: the ring itself (R = 1) or a standpipe
/// (R > 1). Once the depth I has gone in, the head is H0 - R I and the front lies at I / dtheta:
///
///   dI/dt = K (P + C I) / I,   P = (H0 + psi) dtheta,  C = 1 - R dtheta
///   K t   = I/C - (P/C^2) ln(1 + C I/P)           (I^2/(2 P) for C = 0)
///
/// Strictly one-dimensional: the front must not have passed the foot of the wall,
/// I <= d dtheta. The vessel is empty at I = H0/R.
///
/// @source Green & Ampt 1911, J. Agric. Sci. 4:1, with a falling head as in Philip 1992, Water
///   Resour. Res. 28:2147, and Elrick et al. 1995 (form from memory, checked by quadrature)
/// @checked tests/models/theory/falling_head_test.cpp

namespace ringwright::models {

struct FallingHead {
  double K = 0.0;           ///< conductivity behind the front [m/s], > 0
  double psi = 0.0;         ///< suction at the front [m], >= 0
  double dtheta = 0.0;      ///< pores filled by the front [-], 0 < dtheta < 1
  double H0 = 0.0;          ///< head at t = 0 [m], > 0
  double area_ratio = 1.0;  ///< R, area of the ring over that of the vessel's free surface [-], > 0
};

/// Time until the depth I has gone in [s].
/// @param I [m], 0 <= I <= H0/R
/// @throws std::invalid_argument for values out of range
double falling_head_time(const FallingHead& test, double I);

/// Depth I that has gone in by the time t [m]: the inverse, H0/R once the vessel is empty.
/// @param t [s], >= 0 @throws std::invalid_argument for values out of range
double falling_head_infiltration(const FallingHead& test, double t);

/// Conductivity from the time a poured depth takes to go in ("simplified falling head").
///   Kfs = dtheta/((1 - dtheta) t_a) [D/dtheta - (D + psi)/(1 - dtheta)
///         ln(1 + (1 - dtheta) D/(dtheta (D + psi)))]
/// @param depth D, volume poured over the ring's area [m], > 0
/// @param psi suction at the front, 1/alpha* [m], >= 0
/// @param time t_a until the surface is bare [s], > 0
/// @return [m/s], at the temperature of the test
/// @throws std::invalid_argument for values out of range
/// @source Bagarello, Iovino & Elrick 2004, Soil Sci. Soc. Am. J. 68:66 (from memory; it is the
///   time above for R = 1 and I = H0 = D)
double simplified_falling_head_kfs(double depth, double dtheta, double psi, double time);

}  // namespace ringwright::models
