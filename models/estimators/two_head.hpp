#pragma once
/// Kfs and matric flux potential from the rates of one ring at two heads.
///
///   Kfs   = D (i_high - i_low) / (H_high - H_low)
///   phi_m = D [ i_low (D + H_high) - i_high (D + H_low) ] / (H_high - H_low)
///
/// with i the rate [m/s] and D a length that holds the ring's shape, in two published forms that
/// agree to 0.01 %: D = pi a G, G = 0.316 d/a + 0.184 (Reynolds & Elrick), D = 0.993 d + 0.578 a
/// (Nimmo et al.). alpha* = Kfs / phi_m. phi_m is ill-posed; a value not above 0 is no value.
///
/// @source Reynolds & Elrick 1990, Soil Sci. Soc. Am. J. 54:1233; Nimmo et al. 2009, Vadose Zone J.
///   8:142 (equations from memory, algebra checked)
/// @checked tests/models/estimators/two_head_test.cpp

namespace ringwright::models {

/// Rate at one head. @see SteadyRing for a single one
struct HeadAndRate {
  double head = 0.0;  ///< [m]
  double rate = 0.0;  ///< [m/s]
};

/// D = 0.993 d + 0.578 a [m]. @param radius a [m] @param insertion d [m]
double nimmo_shape_length(double radius, double insertion);
/// D = pi a G [m].
double reynolds_elrick_shape_length(double radius, double insertion);

struct TwoHeadResult {
  double Kfs = 0.0;                    ///< [m/s]; not above 0: unphysical
  double matric_flux_potential = 0.0;  ///< phi_m [m2/s]; not above 0: unphysical
};

/// @param shape_length D [m], > 0 @throws std::invalid_argument for equal heads
TwoHeadResult two_head(const HeadAndRate& one, const HeadAndRate& other, double shape_length);

}  // namespace ringwright::models
