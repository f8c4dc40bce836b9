#include "solver/mesh/tip_correction.hpp"

#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>

using namespace ringwright::solver;

// Separation of variables in a wedge of angle 2 pi (Laplace's equation, textbook). By hand, for
// square cells of edge 1, the foot at the origin and the wall along the negative real axis: the
// face on the prolongation runs from 0 to 1, its cells have their centres at (1 + i)/2 and
// (1 - i)/2, at the distance rho = 1/sqrt 2 and angles of +-pi/4.
//   exact flux          Re sqrt(1) - Re sqrt(0) = 1
//   two-point flux      2 sqrt(rho) sin(pi/8) = 2 * 2^(-1/4) * 0.38268343 = 0.64359425
//   factor              1 / 0.64359425 = 1.55377397
TEST_CASE("tip factor of square cells, across the prolongation of the wall", "[solver][mesh]") {
  const double by_hand = 1.0 / (2.0 * std::pow(2.0, -0.25) * std::sin(std::numbers::pi / 8.0));
  CHECK(by_hand == Approx(1.5537740).epsilon(1e-7));
  const double factor = tip_factor(0.0, 1.0, TipPoint(0.5, 0.5), TipPoint(0.5, -0.5));
  CHECK(factor == Approx(by_hand).epsilon(1e-14));
}

// The face beside the foot, from 0 to i: Re sqrt(i) = cos(pi/4) = 0.70710678 exactly; centres at
// the angles pi/4 and 3 pi/4, difference 2^(-1/4) (sin(3 pi/8) - sin(pi/8)) = 0.45508986.
// Their ratio is again 1.55377397, since sin(3 pi/8) - sin(pi/8) = 2 cos(pi/4) sin(pi/8).
TEST_CASE("tip factor of square cells, beside the foot", "[solver][mesh]") {
  const double outer = tip_factor(0.0, TipPoint(0, 1), TipPoint(0.5, 0.5), TipPoint(-0.5, 0.5));
  const double inner = tip_factor(0.0, TipPoint(0, -1), TipPoint(0.5, -0.5), TipPoint(-0.5, -0.5));
  CHECK(outer == Approx(1.5537740).epsilon(1e-7));
  CHECK(inner == Approx(outer).epsilon(1e-14));
}

TEST_CASE("tip factor does not depend on the size of the cells and tends to 1 away from the foot",
          "[solver][mesh]") {
  const double large = tip_factor(0.0, 1.0, TipPoint(0.5, 0.5), TipPoint(0.5, -0.5));
  const double small = tip_factor(0.0, 1e-4, TipPoint(5e-5, 5e-5), TipPoint(5e-5, -5e-5));
  CHECK(small == Approx(large).epsilon(1e-12));
  const double far = tip_factor(40.0, 41.0, TipPoint(40.5, 0.5), TipPoint(40.5, -0.5));
  CHECK(far == Approx(1.0).margin(1e-3));
}
