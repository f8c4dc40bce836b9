#pragma once
/// What a soil is to the flow equation: two curves of the pressure head h.
///
/// The retention curve is kept as the effective saturation
///
///   Se(h) = (theta - theta_r) / (theta_s - theta_r),
///
/// the conductivity as K(h) = Ks Kr(h). Both are dimensionless here, so that the
/// scale factors (Ks, theta_s - theta_r) stay outside: a look-up table made from
/// a curve then serves every soil of the same shape, and rescaling a result in
/// Ks is exact.
///
/// Conventions: h is the pressure head [m], negative where the soil is
/// unsaturated. For h >= entry_head() the soil is saturated: Se = 1, Kr = 1 and
/// both slopes are 0 (the slopes are one-sided limits below it).
///
/// To add a curve: derive, implement the pure functions, add it to the tests in
/// tests/models/soil/curves_test.cpp, which check the slopes against differences
/// and the monotony of both curves.

#include <memory>
#include <string>

namespace ringwright::models {

class Curves {
 public:
  virtual ~Curves() = default;

  /// Effective saturation Se [-] at pressure head h [m].
  virtual double saturation(double h) const = 0;
  /// dSe/dh [1/m].
  virtual double saturation_slope(double h) const = 0;
  /// Relative conductivity Kr = K/Ks [-].
  virtual double relative_conductivity(double h) const = 0;
  /// dKr/dh [1/m].
  virtual double relative_conductivity_slope(double h) const = 0;

  /// Head at and above which the soil is saturated [m], <= 0.
  virtual double entry_head() const = 0;
  /// Head where dSe/dh is largest [m]; the entry head for curves without a maximum below it. Of
  /// several maxima it may be a lower one, if saturation fixes the head better below that.
  /// The solver changes its unknown from h (wetter) to Se (drier) here.
  virtual double steepest_head() const = 0;
  /// Head h [m] at which the saturation is Se, 0 < Se <= 1; the entry head for Se = 1.
  /// The default inverts saturation() numerically.
  virtual double head_at(double Se) const;

  /// Integral of Kr from minus infinity to h [m], the matric flux potential over Ks;
  /// continued with slope 1 above the entry head. The default integrates numerically.
  virtual double relative_flux_potential(double h) const;

  /// One line that names the family and its parameters, for provenance.
  virtual std::string describe() const = 0;
};

/// A soil material: curves and their scale factors.
struct Soil {
  std::shared_ptr<const Curves> curves;
  double theta_r = 0.0;           ///< residual water content [-]
  double theta_s = 0.0;           ///< saturated water content [-]
  double Ks = 0.0;                ///< saturated conductivity at the temperature of the run [m/s]
  double specific_storage = 0.0;  ///< Ss [1/m], acts for h > 0 only
  double anisotropy = 1.0;        ///< horizontal over vertical conductivity, at every h [-]

  double water_content(double h) const {
    return theta_r + (theta_s - theta_r) * curves->saturation(h);
  }
  double conductivity(double h) const { return Ks * curves->relative_conductivity(h); }
};

}  // namespace ringwright::models
