#include "models/theory/tracy_transient.hpp"

#include <catch2/catch.hpp>
#include <stdexcept>

using namespace ringwright::models;

namespace {

constexpr double kDay = 86400.0;

// alpha 0.1 per cm, theta_s - theta_r 0.35, Ks 10 cm/d, h_r -100 cm, L 30 cm.
TracyProblem problem(double width) { return {0.1 / kDay, 10.0, 0.35, -1.0, width, 0.30}; }

struct Point {
  double x, z, t, h;  // cm, cm, d, cm
};

// Inverse Laplace transform of the solution in depth, sinh(beta z)/(p sinh(beta L)) with beta^2 =
// b^2 + c p, which knows nothing of the series: Talbot's contour with 60 terms and 40 digits in
// Python's mpmath.
constexpr Point kPlanar[] = {  // a 20 cm
    {10, 25, .05, -9.919963092468}, {10, 15, .1, -28.70643722287}, {5, 20, .2, -16.11155002578},
    {2, 28, .02, -17.20486305437},  {15, 10, .5, -26.99636248195}, {10, 20, 10, -11.49675310174}};

// The same; the first two also computed for this project by an independent prototype: -12.134018
// and -23.564567 cm.
constexpr Point kAxisymmetric[] = {  // R 10 cm
    {0, 25, .05, -12.13401822929},    {5, 20, 10, -23.56456741037},  {2.5, 15, .1, -36.29659779744},
    {8, 28, .02, -19.29283679696},    {0, 20, .2, -19.76563102861},  {5, 5, .5, -53.72016401093},
    {0, 29.5, .001, -6.584082250082}, {9.5, 25, .3, -37.27407607923}};

}  // namespace

TEST_CASE("Tracy's transient: planar heads", "[theory]") {
  for (const Point& at : kPlanar) {
    INFO("x " << at.x << " z " << at.z << " t " << at.t);
    CHECK(tracy_planar_head(problem(0.20), at.x / 100, at.z / 100, at.t * kDay) ==
          Approx(at.h / 100).epsilon(1e-10));
  }
}

TEST_CASE("Tracy's transient: axisymmetric heads", "[theory]") {
  for (const Point& at : kAxisymmetric) {
    INFO("r " << at.x << " z " << at.z << " t " << at.t);
    CHECK(tracy_axisymmetric_head(problem(0.10), at.x / 100, at.z / 100, at.t * kDay) ==
          Approx(at.h / 100).epsilon(1e-10));
  }
}

TEST_CASE("Tracy's transient: start and boundaries", "[theory]") {
  const TracyProblem p = problem(0.10);
  CHECK(tracy_axisymmetric_head(p, 0.03, 0.20, 0.0) == -1.0);
  CHECK(tracy_axisymmetric_head(p, 0.03, 0.0, kDay) == Approx(-1.0).epsilon(1e-12));
  CHECK(tracy_axisymmetric_head(p, 0.10, 0.20, kDay) == Approx(-1.0).epsilon(1e-9));
  CHECK(tracy_axisymmetric_head(p, 0.0, 0.30, kDay) == Approx(0.0).margin(1e-15));
  CHECK(tracy_planar_head(p, 0.05, 0.30, kDay) == Approx(0.0).margin(1e-15));
  CHECK(tracy_planar_head(p, 0.0, 0.20, kDay) == Approx(-1.0).epsilon(1e-9));
  CHECK(tracy_planar_head(p, 0.03, 0.2999999, 1.0) < 0.0);
}

TEST_CASE("Tracy's transient: values out of range are refused", "[theory]") {
  TracyProblem p = problem(0.10);
  CHECK_THROWS_AS(tracy_planar_head(p, 0.05, 0.2, -1.0), std::invalid_argument);
  p.h_r = 0.0;
  CHECK_THROWS_AS(tracy_axisymmetric_head(p, 0.05, 0.2, 1.0), std::invalid_argument);
}
