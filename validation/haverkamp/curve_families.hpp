#pragma once
/// The two soils of Haverkamp et al. 1977, with the curves fitted there; heads in cm inside the
/// formulas. For checks only.

#include <algorithm>
#include <boost/math/tools/minima.hpp>
#include <cmath>
#include <memory>
#include <utility>

#include "models/soil/curves.hpp"

namespace ringwright::validation {

/// Conductivity of both: Kr = A / (A + |h|^B).
class HaverkampCurves : public models::Curves {
 public:
  HaverkampCurves(double A, double B) : A_(A), B_(B) {}

  double relative_conductivity(double h) const override {
    return h < 0 ? A_ / (A_ + std::pow(suction(h), B_)) : 1.0;
  }
  double relative_conductivity_slope(double h) const override {
    if (h >= 0) return 0.0;
    const double K = relative_conductivity(h), x = suction(h);
    return 100 * K * K * B_ * std::pow(x, B_ - 1) / A_;
  }
  double entry_head() const override { return 0.0; }
  double steepest_head() const override { return steepest_; }

 protected:
  static double suction(double h) { return -100 * h; }  // [cm]
  /// To be called once by the curve, whose slope has one maximum between two suctions [cm].
  void find_steepest(double nearest, double farthest) {
    const auto slope = [this](double x) { return -saturation_slope(-x / 100); };
    steepest_ = -boost::math::tools::brent_find_minima(slope, nearest, farthest, 40).first / 100;
  }

 private:
  double A_, B_, steepest_ = 0.0;
};

/// Sand: Se = 1.611e6 / (1.611e6 + |h|^3.96), K with 1.175e6 and 4.74.
class HaverkampSand final : public HaverkampCurves {
 public:
  HaverkampSand() : HaverkampCurves(1.175e6, 4.74) { find_steepest(5, 60); }

  double saturation(double h) const override {
    return h < 0 ? a / (a + std::pow(suction(h), b)) : 1.0;
  }
  double saturation_slope(double h) const override {
    if (h >= 0) return 0.0;
    const double S = saturation(h), x = suction(h);
    return 100 * S * S * b * std::pow(x, b - 1) / a;
  }
  double head_at(double Se) const override {
    return Se < 1 ? -0.01 * std::pow(a * (1 / Se - 1), 1 / b) : 0.0;
  }
  std::string describe() const override { return "Haverkamp et al. 1977, sand"; }

 private:
  static constexpr double a = 1.611e6, b = 3.96;
};

/// Yolo light clay: Se = 739 / (739 + (ln |h|)^4) for |h| > 1 cm, else 1; K with 124.6 and 1.77.
class YoloLightClay final : public HaverkampCurves {
 public:
  YoloLightClay() : HaverkampCurves(124.6, 1.77) { find_steepest(2, 200); }

  double saturation(double h) const override {
    const double x = suction(h);
    return x > 1 ? a / (a + std::pow(std::log(x), 4)) : 1.0;
  }
  double saturation_slope(double h) const override {
    const double x = suction(h);
    if (x <= 1) return 0.0;
    const double S = saturation(h);
    return 100 * S * S * 4 * std::pow(std::log(x), 3) / (a * x);
  }
  double head_at(double Se) const override {
    return -0.01 * std::exp(std::pow(a * std::max(1 / Se - 1, 0.0), 0.25));
  }
  std::string describe() const override { return "Haverkamp et al. 1977, Yolo light clay"; }

 private:
  static constexpr double a = 739.0;
};

}  // namespace ringwright::validation
