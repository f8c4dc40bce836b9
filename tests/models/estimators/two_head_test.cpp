#include "models/estimators/two_head.hpp"

#include <catch2/catch.hpp>
#include <numbers>
#include <stdexcept>

using namespace ringwright::models;

namespace {

// A ring of 10 cm radius, 5 cm deep.
constexpr double kRadius = 0.10, kInsertion = 0.05;
constexpr double kArea = std::numbers::pi * kRadius * kRadius;

HeadAndRate reading(double head_cm, double flow_cm3_per_s) {
  return {head_cm / 100, flow_cm3_per_s * 1e-6 / kArea};
}

// Steady rate over a known soil by the equation both methods invert: i = K (1 + H/D) + phi_m / D.
double exact_rate(double K, double phi_m, double head, double D) {
  return K * (1 + head / D) + phi_m / D;
}

}  // namespace

TEST_CASE("two heads: known figures", "[estimators]") {
  // Q 1.0 and 1.6 cm3/s at 5 and 15 cm: K 2.052000e-3 cm/s, phi_m 1.892805412e-3 cm2/s; Q 3.0 at
  // 15 cm: phi_m -7.349e-2 cm2/s. Computed for this project by an independent prototype from
  // Reynolds & Elrick 1990: K = (G/a)(Q2 - Q1)/(H2 - H1),
  // phi_m = G/(a (H2 - H1)) [Q1 (H2 + pi a G) - Q2 (H1 + pi a G)].
  const double D = reynolds_elrick_shape_length(kRadius, kInsertion);
  const TwoHeadResult usual = two_head(reading(5, 1.0), reading(15, 1.6), D);
  CHECK(usual.Kfs == Approx(2.052e-5).epsilon(1e-12));
  CHECK(usual.matric_flux_potential == Approx(1.892805412e-7).epsilon(1e-9));
  const TwoHeadResult bad = two_head(reading(5, 1.0), reading(15, 3.0), D);
  CHECK(bad.matric_flux_potential == Approx(-7.349e-6).epsilon(1e-4));
}

TEST_CASE("two heads: the two shape lengths agree to 0.01 %", "[estimators]") {
  // pi a G = 10.744247 cm and 0.993 d + 0.578 a = 10.745 cm (arithmetic); pi 0.316 = 0.99274,
  // pi 0.184 = 0.57805.
  CHECK(reynolds_elrick_shape_length(0.10, 0.05) == Approx(0.10744247).epsilon(1e-7));
  CHECK(nimmo_shape_length(0.10, 0.05) == Approx(0.10745).epsilon(1e-12));
  for (const double d : {0.0, 0.05, 0.2})
    CHECK(nimmo_shape_length(0.15, d) ==
          Approx(reynolds_elrick_shape_length(0.15, d)).epsilon(3e-4));
}

TEST_CASE("two heads: exact rates give the soil back, in either order", "[estimators]") {
  for (const double D : {nimmo_shape_length(0.15, 0.10), 0.03, 1.5}) {
    for (const double lambda : {0.01, 0.08, 1.0}) {
      const double K = 3e-6, phi_m = K * lambda;
      const HeadAndRate low{0.05, exact_rate(K, phi_m, 0.05, D)};
      const HeadAndRate high{0.25, exact_rate(K, phi_m, 0.25, D)};
      for (const TwoHeadResult& r : {two_head(low, high, D), two_head(high, low, D)}) {
        CHECK(r.Kfs == Approx(K).epsilon(1e-11));
        CHECK(r.matric_flux_potential == Approx(phi_m).epsilon(1e-9));
      }
    }
  }
}

TEST_CASE("two heads: a rate that falls as the head rises gives no conductivity", "[estimators]") {
  CHECK(two_head({0.05, 2e-6}, {0.15, 1.9e-6}, 0.1).Kfs < 0.0);
}

TEST_CASE("two heads: impossible input is refused", "[estimators]") {
  CHECK_THROWS_AS(two_head({0.05, 1e-6}, {0.05, 2e-6}, 0.1), std::invalid_argument);
  CHECK_THROWS_AS(two_head({0.05, 1e-6}, {0.15, 2e-6}, 0.0), std::invalid_argument);
  CHECK_THROWS_AS(nimmo_shape_length(0.0, 0.05), std::invalid_argument);
  CHECK_THROWS_AS(reynolds_elrick_shape_length(0.1, -0.05), std::invalid_argument);
}
