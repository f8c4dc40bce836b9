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

// Two materials that meet at the level of the foot, by hand for square cells of edge 1. Three times
// as conductive above: tan^2(s pi/2) = 1/3, s = 1/3. Centres below at rho = 1/sqrt 2 and +-pi/4:
//   U = 2^(-1/6) sin(pi/12) = 0.23058158, across the prolongation 2 U, exact flux 1:
//   factor 1 / 0.46116316 = 2.16843
// Beside the foot: exact flux K2 cos(pi/6) = 0.86602540 K2; centre above at 3 pi/4:
//   U = tan(pi/6) 2^(-1/6) cos(pi/12) = 0.49682; resistance (1/2)/3 + 1/2 = 2/3
TEST_CASE("tip factor where another material begins at the foot", "[solver][mesh]") {
  const double pi = std::numbers::pi, rho = std::pow(2.0, -1.0 / 6.0);
  const TipField field({.contrast = 3.0});
  CHECK(field.exponent() == Approx(1.0 / 3.0).epsilon(1e-14));
  const TipPoint outer(0.5, 0.5), inner(0.5, -0.5), above(-0.5, 0.5);
  const double below = rho * std::sin(pi / 12);
  CHECK(field.factor_below(1.0, inner, outer) == Approx(1.0 / (2 * below)).epsilon(1e-12));
  const double over = std::tan(pi / 6) * rho * std::cos(pi / 12);
  CHECK(field.factor_beside(1.0, above, outer) ==
        Approx(std::cos(pi / 6) / ((over - below) / (2.0 / 3.0))).epsilon(1e-12));
}

TEST_CASE("the field about the foot is continuous where the materials meet", "[solver][mesh]") {
  const TipField field({.contrast = 0.2, .stretch_above = 3.0, .stretch_below = 1.5});
  for (double x : {-2.0, 0.3, 1.0})
    CHECK(field.potential({-1e-9, x}) == Approx(field.potential({1e-9, x})).epsilon(1e-6));
  // equal vertical flow, by differences: K above over K below is 0.2
  const double e = 1e-6, x = 0.7;
  const double over = (field.potential({-e, x}) - field.potential({-2 * e, x})) / e;
  const double under = (field.potential({2 * e, x}) - field.potential({e, x})) / e;
  CHECK(0.2 * over == Approx(under).epsilon(1e-4));
}

TEST_CASE("without contrast and stretch the field gives the factors of one isotropic soil",
          "[solver][mesh]") {
  const TipField field({});
  const TipPoint a(0.4, -0.3), b(0.4, 0.6), c(-0.5, 0.6);
  CHECK(field.factor_below(0.9, a, b) ==
        Approx(tip_factor(0.0, 0.9, a, b) * std::abs(b.imag() - a.imag()) / std::abs(b - a)));
  CHECK(field.factor_beside(1.2, c, b) == Approx(tip_factor(0.0, TipPoint(0, 1.2), c, b)));
}

// Horizontal conductivity k times the vertical: the equation in x / sqrt(k) is isotropic, and a
// face keeps its ratio of exact to two-point flux.
TEST_CASE("anisotropic soil: the factors are those of the stretched cells", "[solver][mesh]") {
  const double k = 6.25, stretch = 2.5;
  CHECK(std::sqrt(k) == stretch);
  const TipField field({.stretch_above = stretch, .stretch_below = stretch});
  const TipPoint a(0.5, -0.5), b(0.5, 0.5), c(-0.5, 0.5);
  const auto wide = [&](TipPoint p) { return TipPoint(p.real(), stretch * p.imag()); };
  CHECK(field.factor_below(1.0, wide(a), wide(b)) == Approx(1.5537740).epsilon(1e-7));
  CHECK(field.factor_beside(stretch, wide(c), wide(b)) == Approx(1.5537740).epsilon(1e-7));
}
