#pragma once
/// Brooks & Corey's power-law curves:
///
///   Se = (h_b / h)^L,  Kr = Se^eta   h < h_b, else 1
///
/// with eta = 2 + l + 2/L after Mualem or 3 + 2/L after Burdine. The capillary length is
/// |h_b| L eta / (L eta - 1).
///
/// @source Brooks & Corey 1964, Hydrology Paper 3, Colorado State University (from memory);
///   Mualem 1976, Water Resour. Res. 12:513; Burdine 1953, Trans. AIME 198:71 (from memory)
/// @checked tests/models/soil/curves_test.cpp, tests/models/soil/brooks_corey_test.cpp

#include "models/soil/curves.hpp"

namespace ringwright::models {

class BrooksCorey final : public Curves {
 public:
  /// Conductivity after Mualem.
  /// @param h_b entry head [m], < 0
  /// @param L pore size index [-], > 0
  /// @param l pore connectivity [-], > -2
  /// @throws std::invalid_argument for values outside these ranges
  BrooksCorey(double h_b, double L, double l = 0.5);

  /// Conductivity after Burdine: eta = 3 + 2/L.
  static BrooksCorey burdine(double h_b, double L);
  /// Any exponent. @param eta [-], L eta > 1 (else the flux potential is infinite)
  static BrooksCorey with_exponent(double h_b, double L, double eta);

  double saturation(double h) const override;
  double saturation_slope(double h) const override;
  double relative_conductivity(double h) const override;
  double relative_conductivity_slope(double h) const override;
  double entry_head() const override { return h_b_; }
  double steepest_head() const override { return h_b_; }
  /// No drier than -1e300 m.
  double head_at(double Se) const override;
  double relative_flux_potential(double h) const override;
  std::string describe() const override;

  double pore_size_index() const { return L_; }
  double exponent() const { return eta_; }

 private:
  double h_b_, L_, eta_;
};

}  // namespace ringwright::models
