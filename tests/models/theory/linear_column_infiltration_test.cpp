#include "models/theory/linear_column_infiltration.hpp"

#include <catch2/catch.hpp>
#include <limits>
#include <stdexcept>

using namespace ringwright::models;

namespace {

constexpr double kDay = 86400.0;

// alpha 0.05 per cm, Ks 10 cm/d, theta_s - theta_r 0.35, h_i -200 cm.
LinearColumnInfiltration column() { return {0.1 / kDay, 5.0, 0.35, -2.0}; }

struct Surface {
  double t, q, I;  // d, cm/d, cm
};

// Inverse Laplace transforms of the flux and its integral, which know nothing of error functions:
// Talbot's contour with 60 terms and 40 digits in Python's mpmath. The volumes at 0.01, 0.1, 0.5
// and 2 d were also computed for this project by an independent prototype: 0.995153, 3.520711,
// 9.565811, 26.323727 cm.
constexpr Surface kSurface[] = {
    {0.001, 154.3172884754, 0.3035632770487}, {0.01, 52.37004711655, 0.9951525935394},
    {0.1, 20.45653685688, 3.52071053223},     {0.5, 12.83327016368, 9.565810882376},
    {2.0, 10.47397740656, 26.32372667698},    {20.0, 10.00004910052, 206.9995648947}};

struct Inside {
  double depth, t, h;  // cm, d, cm
};

// By the same route.
constexpr Inside kInside[] = {{1, .01, -4.809994287338}, {5, .05, -11.1732324866},
                              {10, .1, -16.3784764663},  {40, .5, -29.69169693107},
                              {60, 2, -9.574585753436},  {400, 10, -34.64484142296},
                              {150, .5, -199.9944763369}};

}  // namespace

TEST_CASE("linear column: rate and volume", "[theory]") {
  for (const Surface& at : kSurface) {
    INFO("t " << at.t);
    CHECK(column().rate(at.t * kDay) == Approx(at.q * 0.01 / kDay).epsilon(1e-11));
    CHECK(column().infiltration(at.t * kDay) == Approx(at.I * 0.01).epsilon(1e-11));
  }
  CHECK(column().infiltration(0.0) == 0.0);
}

TEST_CASE("linear column: heads", "[theory]") {
  for (const Inside& at : kInside) {
    INFO("depth " << at.depth << " t " << at.t);
    CHECK(column().head(at.depth * 0.01, at.t * kDay) == Approx(at.h * 0.01).epsilon(1e-10));
  }
  CHECK(column().head(0.0, kDay) == 0.0);
  CHECK(column().head(0.1, 0.0) == Approx(-2.0).epsilon(1e-14));
}

TEST_CASE("linear column: very long times go to full depth at the steady rate", "[theory]") {
  // Limit: q to Ks, h to 0. The exponentials of the profile overflow by themselves there.
  CHECK(column().rate(1e6 * kDay) == Approx(0.1 / kDay).epsilon(1e-12));
  CHECK(column().head(5000.0, 1e6 * kDay) == Approx(0.0).margin(1e-12));
}

TEST_CASE("linear column: values out of range are refused", "[theory]") {
  CHECK_THROWS_AS(column().rate(0.0), std::invalid_argument);
  CHECK_THROWS_AS(column().infiltration(-1.0), std::invalid_argument);
  CHECK_THROWS_AS(column().head(-0.1, 1.0), std::invalid_argument);
  CHECK_THROWS_AS(LinearColumnInfiltration(0.0, 5.0, 0.35, -2.0), std::invalid_argument);
  CHECK_THROWS_AS(LinearColumnInfiltration(1e-6, 5.0, 0.35, 0.0), std::invalid_argument);
}
