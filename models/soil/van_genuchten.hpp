#pragma once
/// van Genuchten - Mualem curves with a minimum capillary height.
///
///   X   = (alpha |h|)^n,  m = 1 - 1/n,  S(X) = (1 + X)^-m,  F(X) = 1 - (X / (1 + X))^m
///   Se  = S(X) / S(X_s)                       h < h_s, else 1
///   Kr  = Se^l (F(X) / F(X_s))^2              h < h_s, else 1,   X_s = (alpha |h_s|)^n
///
/// Without h_s (h_s = 0) and with n < 2, dKr/dh grows without bound towards h = 0, from pores
/// wider than any real one; a minimum capillary height of 1 to 2 cm removes it and changes the
/// capillary length of fine soils by up to ten times.
///
/// @source van Genuchten 1980, Soil Sci. Soc. Am. J. 44:892; Mualem 1976, Water Resour. Res.
///   12:513; Vogel, van Genuchten & Cislerova 2001, Adv. Water Resour. 24:133 (h_s)
/// @checked tests/models/soil/curves_test.cpp, tests/models/soil/van_genuchten_test.cpp

#include "models/soil/curves.hpp"

namespace ringwright::models {

class VanGenuchten final : public Curves {
 public:
  /// @param alpha [1/m], > 0
  /// @param n [-], > 1
  /// @param l pore connectivity [-], > -2 (Kr is then surely monotone)
  /// @param h_s minimum capillary height [m], <= 0
  /// @throws std::invalid_argument for values outside these ranges
  VanGenuchten(double alpha, double n, double l = 0.5, double h_s = 0.0);

  double saturation(double h) const override;
  double saturation_slope(double h) const override;
  double relative_conductivity(double h) const override;
  double relative_conductivity_slope(double h) const override;
  double entry_head() const override { return h_s_; }
  /// Where X = m, or the entry head if that is drier.
  double steepest_head() const override;
  /// Closed form; no drier than -1e300 m, since fine soils exceed the range of doubles.
  double head_at(double Se) const override;
  std::string describe() const override;

  double alpha() const { return alpha_; }
  double n() const { return n_; }
  double l() const { return l_; }

 private:
  double log_x(double h) const;

  double alpha_, n_, m_, l_, h_s_;
  double log_one_plus_x_s_;  ///< ln(1 + X_s)
  double f_s_;               ///< F(X_s)
};

}  // namespace ringwright::models
