#pragma once
/// Curves of a soil with several pore systems, each of van Genuchten's shape: aggregated soil, or
/// soil with macropores.
///
///   X_i = (alpha_i |h|)^n_i,  m_i = 1 - 1/n_i
///   S_i = (1 + X_i)^-m_i,  F_i = 1 - (X_i / (1 + X_i))^m_i = 1 - (1 - S_i^(1/m_i))^m_i
///   A(h) = sum w_i S_i,  B(h) = sum w_i alpha_i F_i,  sum w_i = 1
///   Se  = A(h) / A(h_s)                        h < h_s, else 1
///   Kr  = Se^l (B(h) / B(h_s))^2               h < h_s, else 1
///
/// B is Mualem's integral of dS/|h|, which is linear in the weights. With one system, or equal
/// ones, this is VanGenuchten. The minimum capillary height h_s acts as there: with h_s = 0 and
/// any n_i < 2, dKr/dh grows without bound towards h = 0, the faster the larger alpha_i.
///
/// @source Durner 1994, Water Resour. Res. 30:211 (retention); Priesack & Durner 2006, Vadose Zone
///   J. 5:121 (conductivity; both from memory, checked against quadrature of Mualem's integral);
///   Vogel, van Genuchten & Cislerova 2001, Adv. Water Resour. 24:133 (h_s; its use with several
///   systems follows from the same truncation of the integral)
/// @checked tests/models/soil/curves_test.cpp, tests/models/soil/durner_test.cpp,
///   tests/solver/flow/curve_table_test.cpp

#include <vector>

#include "models/soil/curves.hpp"

namespace ringwright::models {

/// One pore system.
struct PoreSystem {
  double weight = 1.0;  ///< w share of the pore space [-], > 0
  double alpha = 0.0;   ///< [1/m], > 0
  double n = 0.0;       ///< [-], > 1
};

class Durner final : public Curves {
 public:
  /// @param systems at least one, in any order; weights sum to 1 within 1e-6 and are scaled to it
  /// @param l pore connectivity [-], > -2 (Kr is then surely monotone)
  /// @param h_s minimum capillary height [m], <= 0
  /// @throws std::invalid_argument for values outside these ranges
  Durner(std::vector<PoreSystem> systems, double l = 0.5, double h_s = 0.0);

  double saturation(double h) const override;
  double saturation_slope(double h) const override;
  double relative_conductivity(double h) const override;
  double relative_conductivity_slope(double h) const override;
  double entry_head() const override { return h_s_; }
  /// The highest maximum of dSe/dh, of several, but none that a plateau of saturation divides from
  /// a drier one (dSe/d ln|h| below 1e-3): drier than this head the solver works with saturation,
  /// which does not fix the head there. Where the systems lie so close together that there is one
  /// maximum only, that one; the entry head if the slope is largest there.
  /// In soils with macropores this mostly is the wettest maximum: with it the solver took up to
  /// 47 % fewer Newton steps than with the drier one, at worst 6 % more (20 ring tests); where a
  /// plateau lies between, the drier one took up to 32 % fewer.
  double steepest_head() const override { return steepest_; }
  std::string describe() const override;

  const std::vector<PoreSystem>& systems() const { return systems_; }
  double l() const { return l_; }

 private:
  struct Bracket {
    double value, slope;
  };
  double retention(double h) const;
  double retention_slope(double h) const;
  Bracket bracket(double h) const;
  double slope_growth(double h) const;
  std::vector<double> maxima() const;
  double flattest(double wet, double dry) const;
  double switch_head() const;

  std::vector<PoreSystem> systems_;
  double l_, h_s_;
  double retention_s_ = 1.0;  ///< A(h_s)
  double bracket_s_ = 1.0;    ///< B(h_s)
  double steepest_ = 0.0;
};

}  // namespace ringwright::models
