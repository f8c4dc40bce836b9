#pragma once
/// Infiltration with a sharp front (Green & Ampt), surface ponded from the start:
///
///   K t = I - P ln(1 + I/P),  q = K (1 + P/I),  P = (psi + H) dtheta
///
/// @source Green & Ampt 1911, J. Agric. Sci. 4:1; as in Chow, Maidment & Mays 1988, Applied
///   Hydrology, section 4.3
/// @checked tests/models/theory/green_ampt_test.cpp

namespace ringwright::models {

struct GreenAmpt {
  double K = 0.0;       ///< conductivity behind the front [m/s], > 0
  double psi = 0.0;     ///< suction at the front [m]; psi + H > 0
  double dtheta = 0.0;  ///< pores filled by the front [-], > 0
  double H = 0.0;       ///< depth of the pond [m]
};

/// I [m] at t [s], >= 0. @throws std::invalid_argument for values out of range
double green_ampt_infiltration(const GreenAmpt& soil, double t);

/// q [m/s] once I [m], > 0, has gone in. @throws std::invalid_argument for values out of range
double green_ampt_rate(const GreenAmpt& soil, double I);

}  // namespace ringwright::models
