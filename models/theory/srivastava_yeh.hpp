#pragma once
/// Transient rain on a uniform column of a linear (Gardner) soil above a water table: exact.
///
/// z up from the water table (h = 0 there), L the height of the surface; steady flow q_A before
/// t = 0, flux q_B through the surface from then on. With z* = alpha z, L* = alpha L,
/// t* = alpha Ks t/(theta_s - theta_r), fluxes over Ks:
///
///   K/Ks = exp(alpha h) = q_B - (q_B - 1) exp(-z*)
///          - 4 (q_B - q_A) exp((L* - z*)/2 - t*/4)
///            sum over roots of sin(l z*) sin(l L*) exp(-l^2 t*) / (1 + L*/2 + 2 l^2 L*)
///   tan(l L*) + 2 l = 0,  l > 0
///
/// @source Srivastava & Yeh 1991, Water Resour. Res. 27:753 (from memory; the equation, start and
///   flux condition checked)
/// @checked tests/models/theory/srivastava_yeh_test.cpp

namespace ringwright::models {

/// All scaled as above.
struct SrivastavaYehProblem {
  double L = 0.0;    ///< L* [-], > 0
  double q_A = 0.0;  ///< [-]
  double q_B = 0.0;  ///< [-]
};

/// K/Ks [-] at z* in [0, L*] and t* >= 0; alpha h is its logarithm.
/// @throws std::invalid_argument for values outside
double srivastava_yeh_conductivity(const SrivastavaYehProblem& problem, double z, double t);

}  // namespace ringwright::models
