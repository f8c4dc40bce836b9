// Properties every soil curve must have; the expectations follow from models/soil/curves.hpp.
#include "models/soil/curves.hpp"

#include <boost/math/quadrature/gauss_kronrod.hpp>
#include <catch2/catch.hpp>
#include <cmath>
#include <random>

#include "tests/models/soil/sample_curves.hpp"

using namespace ringwright::models;

namespace {

// Heads even in ln|h|, from 0.1 mm below the entry head to a suction of 1000 m.
std::vector<double> random_heads(const Curves& curves, int count) {
  std::mt19937_64 generator(20240517);
  std::uniform_real_distribution<double> log_suction(std::log(1e-4), std::log(1e3));
  std::vector<double> heads;
  while (static_cast<int>(heads.size()) < count) {
    heads.push_back(curves.entry_head() - std::exp(log_suction(generator)));
  }
  return heads;
}

// Fourth-order central difference of f at h with a step in proportion to |h - entry|.
template <class Function>
double difference(const Function& f, double h, double room) {
  const double e = 1e-3 * room;
  return (8 * (f(h + e) - f(h - e)) - (f(h + 2 * e) - f(h - 2 * e))) / (12 * e);
}

// What rounding of f alone may make of a difference.
double rounding(double value, double room) { return 1e-15 * value / (1e-3 * room); }

// The default inversion and integral, with closed forms of the curve itself hidden.
class DefaultsOnly final : public Curves {
 public:
  explicit DefaultsOnly(std::shared_ptr<const Curves> curves) : curves_(std::move(curves)) {}
  double saturation(double h) const override { return curves_->saturation(h); }
  double saturation_slope(double h) const override { return curves_->saturation_slope(h); }
  double relative_conductivity(double h) const override {
    return curves_->relative_conductivity(h);
  }
  double relative_conductivity_slope(double h) const override {
    return curves_->relative_conductivity_slope(h);
  }
  double entry_head() const override { return curves_->entry_head(); }
  double steepest_head() const override { return curves_->steepest_head(); }
  std::string describe() const override { return curves_->describe(); }

 private:
  std::shared_ptr<const Curves> curves_;
};

}  // namespace

TEST_CASE("curves: slopes are those of differences", "[soil]") {
  for (const auto& [name, curves] : sample_curves()) {
    INFO(name);
    for (const double h : random_heads(*curves, 60)) {
      INFO("h " << h);
      // Exponential curves bend over 1/alpha, power laws over |h|: stay below both.
      const double room = std::min({curves->entry_head() - h, -h, 0.03});
      if (curves->saturation(h) < 1e-290) continue;  // exponential curves underflow
      const auto Se = [&](double x) { return curves->saturation(x); };
      const auto Kr = [&](double x) { return curves->relative_conductivity(x); };
      const double C = curves->saturation_slope(h);
      const double dK = curves->relative_conductivity_slope(h);
      REQUIRE(difference(Se, h, room) == Approx(C).epsilon(1e-7).margin(rounding(Se(h), room)));
      REQUIRE(difference(Kr, h, room) == Approx(dK).epsilon(1e-7).margin(rounding(Kr(h), room)));
    }
  }
}

TEST_CASE("curves: positive, at most 1, and falling with suction", "[soil]") {
  for (const auto& [name, curves] : sample_curves()) {
    INFO(name);
    double last_Se = 1.0;
    double last_Kr = 1.0;
    for (double s = std::log(1e-6); s < std::log(1e5); s += 0.01) {
      const double h = curves->entry_head() - std::exp(s);
      INFO("h " << h);
      const double Se = curves->saturation(h);
      const double Kr = curves->relative_conductivity(h);
      const bool underflow = name.starts_with("Gardner") && h < -10.0;
      REQUIRE((Se > 0.0 || underflow));
      REQUIRE((Kr > 0.0 || underflow));
      REQUIRE(Se <= last_Se);
      REQUIRE(Kr <= last_Kr);
      REQUIRE(curves->saturation_slope(h) >= 0.0);
      REQUIRE(curves->relative_conductivity_slope(h) >= 0.0);
      last_Se = Se;
      last_Kr = Kr;
    }
  }
}

TEST_CASE("curves: saturated at and above the entry head", "[soil]") {
  for (const auto& [name, curves] : sample_curves()) {
    INFO(name);
    REQUIRE(curves->entry_head() <= 0.0);
    for (const double above : {0.0, 1e-9, 0.5, 20.0}) {
      const double h = curves->entry_head() + above;
      CHECK(curves->saturation(h) == 1.0);
      CHECK(curves->relative_conductivity(h) == 1.0);
      CHECK(curves->saturation_slope(h) == 0.0);
      CHECK(curves->relative_conductivity_slope(h) == 0.0);
    }
    CHECK(curves->saturation(curves->entry_head() - 1e-12) == Approx(1.0).epsilon(1e-9));
  }
}

TEST_CASE("curves: the steepest head is where dSe/dh is largest", "[soil]") {
  for (const auto& [name, curves] : sample_curves()) {
    INFO(name);
    const double steepest = curves->steepest_head();
    REQUIRE(steepest <= curves->entry_head());
    const double below = steepest - 1e-9;
    const double largest = curves->saturation_slope(below);
    for (double s = std::log(1e-6); s < std::log(1e4); s += 0.02) {
      REQUIRE(curves->saturation_slope(curves->entry_head() - std::exp(s)) <= largest * (1 + 1e-6));
    }
  }
}

TEST_CASE("curves: the head of a saturation gives that saturation", "[soil]") {
  for (const auto& [name, curves] : sample_curves()) {
    INFO(name);
    const DefaultsOnly defaults(curves);
    CHECK(curves->head_at(1.0) == curves->entry_head());
    CHECK(defaults.head_at(1.0) == curves->entry_head());
    for (const double Se : {0.9999, 0.99, 0.9, 0.7, 0.5, 0.3, 0.1, 0.02, 1e-3, 1e-6}) {
      INFO("Se " << Se);
      const double h = curves->head_at(Se);
      REQUIRE(std::isfinite(h));
      REQUIRE(curves->saturation(h) == Approx(Se).epsilon(1e-12));
      REQUIRE(defaults.saturation(defaults.head_at(Se)) == Approx(Se).epsilon(1e-12));
    }
    for (const double Se : {1e-100, 1e-300}) {
      CHECK(std::isfinite(curves->head_at(Se)));
      CHECK(std::isfinite(defaults.head_at(Se)));
      CHECK(curves->head_at(Se) < curves->head_at(1e-6));
    }
    CHECK_THROWS_AS(curves->head_at(0.0), std::invalid_argument);
    CHECK_THROWS_AS(defaults.head_at(-0.1), std::invalid_argument);
  }
}

TEST_CASE("curves: the flux potential is the integral of Kr", "[soil]") {
  using Rule = boost::math::quadrature::gauss_kronrod<double, 61>;
  for (const auto& [name, curves] : sample_curves()) {
    INFO(name);
    for (const double h : random_heads(*curves, 12)) {
      INFO("h " << h);
      // Over a stretch short enough for one rule of high order.
      const double next = h + 0.2 * std::min({curves->entry_head() - h, -h, 0.1});
      const double rise = Rule::integrate(
          [&](double x) { return curves->relative_conductivity(x); }, h, next, 0, 0.0);
      const double low = curves->relative_flux_potential(h);
      const double high = curves->relative_flux_potential(next);
      if (high == 0.0) continue;  // exponential curves underflow
      REQUIRE(low >= 0.0);
      REQUIRE(high - low == Approx(rise).epsilon(1e-9).margin(2e-13 * high));
    }
    const double entry = curves->relative_flux_potential(curves->entry_head());
    CHECK(curves->relative_flux_potential(curves->entry_head() + 0.3) ==
          Approx(entry + 0.3).epsilon(1e-13));
  }
}

TEST_CASE("curves: the numerical flux potential meets the closed forms", "[soil]") {
  for (const auto& [name, curves] : sample_curves()) {
    if (name.starts_with("Gardner") || name.starts_with("Brooks")) {
      INFO(name);
      const DefaultsOnly defaults(curves);
      for (const double h : {0.5, 0.0, -1e-6, -0.03, -0.3, -3.0, -15.0}) {
        INFO("h " << h);
        CHECK(defaults.relative_flux_potential(h) ==
              Approx(curves->relative_flux_potential(h)).epsilon(1e-11));
      }
    }
  }
}
