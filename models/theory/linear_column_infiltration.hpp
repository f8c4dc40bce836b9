#pragma once
/// Infiltration into a deep uniform column of a linear (Gardner) soil from a surface kept at h = 0:
/// exact, with gravity.
///
///   K = Ks exp(alpha h), theta = theta_r + (theta_s - theta_r) exp(alpha h)
///   D = Ks / (alpha (theta_s - theta_r)),  k = Ks / (theta_s - theta_r),  dK = Ks - Ki
///   tau = (k/2) sqrt(t/D),  B = exp(-tau^2) / sqrt(pi)
///   q = Ki + dK [ (1 + erf tau)/2 + B / (2 tau) ]
///   I = Ki t + dK [ t (1 + erf tau)/2 + t B / (2 tau) + (D/k^2) erf tau ]
///   K(x, t) = Ki + dK/2 [ erfc((x - k t)/(2 sqrt(D t))) + exp(k x/D) erfc((x + k t)/(2 sqrt(D t)))
///   ]
///
/// @source Philip 1969, Adv. Hydrosci. 5:215 (equations from memory, re-derived)
/// @checked tests/models/theory/linear_column_infiltration_test.cpp

namespace ringwright::models {

class LinearColumnInfiltration {
 public:
  /// @param Ks [m/s] @param alpha [1/m] @param content_range theta_s - theta_r [-]
  /// @param h_i head at the start and far below [m], < 0
  /// @throws std::invalid_argument for values not above 0, or h_i not below 0
  LinearColumnInfiltration(double Ks, double alpha, double content_range, double h_i);

  /// Infiltration rate q [m/s] at t [s], > 0: without bound at t = 0.
  double rate(double t) const;
  /// Cumulative infiltration I [m] at t [s], >= 0.
  double infiltration(double t) const;
  /// Pressure head [m] at a depth [m], >= 0, and t [s], >= 0.
  double head(double depth, double t) const;

 private:
  double Ks_, alpha_, Ki_, k_, D_;
};

}  // namespace ringwright::models
