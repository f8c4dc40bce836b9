#include "models/theory/falling_head.hpp"

#include <boost/math/quadrature/gauss_kronrod.hpp>
#include <catch2/catch.hpp>
#include <cmath>
#include <stdexcept>

using namespace ringwright::models;

namespace {

// Time from the rate by quadrature, dt = I dI / (K (P + C I)): another way than the closed form.
double time_by_quadrature(const FallingHead& test, double I) {
  using Rule = boost::math::quadrature::gauss_kronrod<double, 61>;
  const auto slowness = [&](double x) {
    const double drive = test.H0 - test.area_ratio * x + test.psi + x / test.dtheta;
    return x / (test.dtheta * test.K * drive);
  };
  return Rule::integrate(slowness, 0.0, I, 10, 1e-13);
}

}  // namespace

TEST_CASE("falling head: known figures of a standpipe over a tight soil", "[theory]") {
  // R 20, dtheta 0.1, H0 50 cm, psi 30 cm, K 1e-6 cm/s: 16308.169 s for 0.5 cm, 68251.141 s for 1
  // cm. Computed for this project by an independent prototype (equation in the header, C = -1).
  const FallingHead test{1e-8, 0.30, 0.1, 0.50, 20.0};
  CHECK(falling_head_time(test, 0.005) == Approx(16308.169).epsilon(5e-8));
  CHECK(falling_head_time(test, 0.010) == Approx(68251.141).epsilon(5e-8));
  CHECK(falling_head_infiltration(test, 16308.169) == Approx(0.005).epsilon(1e-7));
  CHECK(falling_head_infiltration(test, 68251.141) == Approx(0.010).epsilon(1e-7));
}

TEST_CASE("falling head: known figure of a poured depth", "[theory]") {
  // dtheta 0.30, D 2 cm, t_a 300 s, alpha* 0.12 per cm: 1.664670855e-3 cm/s. Computed for this
  // project by an independent prototype from Bagarello, Iovino & Elrick 2004.
  CHECK(simplified_falling_head_kfs(0.02, 0.30, 1.0 / 12.0, 300.0) ==
        Approx(1.664670855e-5).epsilon(1e-9));
}

TEST_CASE("falling head: the closed form is the integral of the rate", "[theory]") {
  for (const double dtheta : {0.02, 0.1, 0.45}) {
    for (const double R : {0.5, 1.0, 1.0 / dtheta, 1.0 / dtheta * (1 + 1e-9),
                           1.0 / dtheta * (1 - 1e-5), 1.0 / dtheta * 1.1, 40.0}) {
      const FallingHead test{2e-6, 0.12, dtheta, 0.20, R};
      for (const double share : {1e-3, 0.1, 0.7, 1.0}) {
        INFO("dtheta " << dtheta << " R " << R << " share " << share);
        const double I = share * 0.20 / R;
        CHECK(falling_head_time(test, I) == Approx(time_by_quadrature(test, I)).epsilon(1e-11));
      }
    }
  }
}

TEST_CASE("falling head: level fed as fast as it falls", "[theory]") {
  // C = 0: t = I^2 / (2 K P), by integration.
  const FallingHead test{1e-6, 0.1, 0.25, 0.3, 4.0};
  CHECK(falling_head_time(test, 0.05) == Approx(0.05 * 0.05 / (2 * 1e-6 * 0.1)).epsilon(1e-14));
}

TEST_CASE("falling head: a very wide vessel is a constant head", "[theory]") {
  // R -> 0: Green & Ampt, K t = I - P ln(1 + I/P) with P = (H0 + psi) dtheta.
  const FallingHead test{1e-6, 0.15, 0.3, 0.10, 1e-9};
  const double P = 0.25 * 0.3;
  for (const double I : {0.01, 0.1, 1.0})
    CHECK(falling_head_time(test, I) * 1e-6 == Approx(I - P * std::log1p(I / P)).epsilon(1e-7));
}

TEST_CASE("falling head: depth and time are inverse to each other", "[theory]") {
  for (const double R : {0.2, 1.0, 9.9999, 10.0, 50.0}) {
    const FallingHead test{3e-7, 0.2, 0.1, 0.4, R};
    for (const double share : {1e-9, 1e-4, 0.3, 0.999}) {
      INFO("R " << R << " share " << share);
      const double I = share * 0.4 / R;
      CHECK(falling_head_infiltration(test, falling_head_time(test, I)) ==
            Approx(I).epsilon(1e-12));
    }
    CHECK(falling_head_infiltration(test, 0.0) == 0.0);
    CHECK(falling_head_infiltration(test, 1e12) == 0.4 / R);
  }
}

TEST_CASE("falling head: time goes with 1/K", "[theory]") {
  const FallingHead slow{1e-8, 0.3, 0.2, 0.1, 1.0}, fast{1e-5, 0.3, 0.2, 0.1, 1.0};
  CHECK(falling_head_time(slow, 0.06) ==
        Approx(1000 * falling_head_time(fast, 0.06)).epsilon(1e-13));
}

TEST_CASE("falling head: values out of range are refused", "[theory]") {
  const FallingHead test{1e-6, 0.1, 0.3, 0.1, 2.0};
  CHECK_THROWS_AS(falling_head_time(test, 0.051), std::invalid_argument);
  CHECK_THROWS_AS(falling_head_time(test, -0.001), std::invalid_argument);
  CHECK_THROWS_AS(falling_head_infiltration(test, -1.0), std::invalid_argument);
  CHECK_THROWS_AS(falling_head_time({0.0, 0.1, 0.3, 0.1, 1.0}, 0.01), std::invalid_argument);
  CHECK_THROWS_AS(falling_head_time({1e-6, -0.1, 0.3, 0.1, 1.0}, 0.01), std::invalid_argument);
  CHECK_THROWS_AS(falling_head_time({1e-6, 0.1, 0.0, 0.1, 1.0}, 0.01), std::invalid_argument);
  CHECK_THROWS_AS(falling_head_time({1e-6, 0.1, 0.3, 0.0, 1.0}, 0.0), std::invalid_argument);
  CHECK_THROWS_AS(falling_head_time({1e-6, 0.1, 0.3, 0.1, 0.0}, 0.01), std::invalid_argument);
  CHECK_THROWS_AS(simplified_falling_head_kfs(0.02, 0.3, 0.1, 0.0), std::invalid_argument);
}
