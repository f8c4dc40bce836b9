#include "models/soil/durner.hpp"

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>
#include <limits>
#include <stdexcept>

#include "models/soil/van_genuchten.hpp"

using namespace ringwright::models;

namespace {

struct Point {
  double h_s, h, Se, Kr;
};

// Mualem's integral of dS/|h| itself (Mualem 1976, Water Resour. Res. 12:513) by quadrature over
// ln|h| with 40 digits in Python's mpmath, not by the closed bracket the code uses; S as printed
// in the header. Two systems.
constexpr Point kTwo[] = {
    {0, -0.03, 0.942391793810694, 0.26476091343716},
    {0, -0.3, 0.643540970044861, 0.000774251927070922},
    {0, -3.0, 0.453163744627637, 1.33035154633494e-5},
    {0, -100.0, 0.125420726245958, 6.5898724636877e-10},
    {0, -100000.0, 0.00791709374114674, 6.60885765667068e-19},
    {-0.02, -0.03, 0.969367337321044, 0.604074709662659},
    {-0.02, -0.3, 0.661962042418529, 0.00176652211226839},
    {-0.02, -3.0, 0.466135354090708, 3.03531104221049e-5},
    {-0.02, -100.0, 0.129010838426654, 1.50353586695905e-9},
    {-0.02, -100000.0, 0.00814371700770367, 1.50786750140999e-18},
};
// The same, three systems.
constexpr Point kThree[] = {
    {-0.01, -0.03, 0.976694217929586, 0.297586456865835},
    {-0.01, -1.0, 0.604488251621057, 0.00208222859398949},
    {-0.01, -100.0, 0.0412154240363556, 4.54686285163977e-10},
};

Durner two_systems(double h_s) { return Durner({{0.4, 20.0, 2.1}, {0.6, 0.5, 1.4}}, 0.5, h_s); }

Durner three_systems(double h_s) {
  return Durner({{0.08, 200.0, 3.0}, {0.62, 3.6, 1.56}, {0.3, 0.4, 1.8}}, 0.5, h_s);
}

void check_equal(const Curves& one, const Curves& other) {
  CHECK(one.entry_head() == other.entry_head());
  CHECK(one.steepest_head() == Approx(other.steepest_head()).epsilon(1e-13));
  for (double s = -4.0; s <= 5.0; s += 0.25) {
    const double h = -std::pow(10.0, s);
    INFO("h " << h);
    CHECK(one.saturation(h) == Approx(other.saturation(h)).epsilon(1e-13));
    CHECK(one.saturation_slope(h) == Approx(other.saturation_slope(h)).epsilon(1e-13));
    CHECK(one.relative_conductivity(h) == Approx(other.relative_conductivity(h)).epsilon(1e-12));
    CHECK(one.relative_conductivity_slope(h) ==
          Approx(other.relative_conductivity_slope(h)).epsilon(1e-12));
  }
}

// Largest dSe/dh over all suctions, by looking.
double largest_slope(const Curves& curves) {
  double largest = 0.0;
  for (double s = std::log(1e-6); s < std::log(1e4); s += 0.002)
    largest = std::max(largest, curves.saturation_slope(curves.entry_head() - std::exp(s)));
  return largest;
}

bool is_maximum(const Curves& curves, double h) {
  const double at = curves.saturation_slope(h);
  return at > curves.saturation_slope(h * 1.01) && at > curves.saturation_slope(h / 1.01);
}

}  // namespace

TEST_CASE("Durner: conductivity is Mualem's integral", "[soil]") {
  for (const Point& p : kTwo) {
    INFO("h_s " << p.h_s << " h " << p.h);
    const Durner curves = two_systems(p.h_s);
    CHECK(curves.saturation(p.h) == Approx(p.Se).epsilon(1e-13));
    CHECK(curves.relative_conductivity(p.h) == Approx(p.Kr).epsilon(1e-12));
  }
  for (const Point& p : kThree) {
    INFO("h " << p.h);
    const Durner curves = three_systems(p.h_s);
    CHECK(curves.saturation(p.h) == Approx(p.Se).epsilon(1e-13));
    CHECK(curves.relative_conductivity(p.h) == Approx(p.Kr).epsilon(1e-12));
  }
}

TEST_CASE("Durner: one system, or equal ones, are van Genuchten's", "[soil]") {
  for (const double h_s : {0.0, -0.02}) {
    for (const double n : {1.09, 1.56, 2.68}) {
      const VanGenuchten plain(3.6, n, 0.5, h_s);
      check_equal(Durner({{1.0, 3.6, n}}, 0.5, h_s), plain);
      check_equal(Durner({{0.3, 3.6, n}, {0.7, 3.6, n}}, 0.5, h_s), plain);
    }
  }
}

TEST_CASE("Durner: the order of the systems does not matter", "[soil]") {
  check_equal(Durner({{0.6, 0.5, 1.4}, {0.4, 20.0, 2.1}}, 0.5, -0.01), two_systems(-0.01));
}

TEST_CASE("Durner: a vanishing system leaves the other", "[soil]") {
  const VanGenuchten plain(0.5, 1.8, 0.5, -0.02);
  const Durner nearly({{1e-9, 10.0, 2.5}, {1.0 - 1e-9, 0.5, 1.8}}, 0.5, -0.02);
  for (const double h : {-0.03, -0.5, -20.0}) {
    CHECK(nearly.saturation(h) == Approx(plain.saturation(h)).epsilon(1e-7));
    CHECK(nearly.relative_conductivity(h) == Approx(plain.relative_conductivity(h)).epsilon(1e-6));
  }
}

TEST_CASE("Durner: steepest at the highest maximum", "[soil]") {
  const Durner curves = two_systems(0.0);  // the wetter is the higher: 0.4 x 20 against 0.6 x 0.5
  CHECK(curves.steepest_head() > -0.05);
  CHECK(is_maximum(curves, curves.steepest_head()));
  CHECK(curves.saturation_slope(curves.steepest_head()) >= largest_slope(curves) * (1 - 1e-12));
  // A wet hump of 0.0001 x 100 against 0.9999 x 0.1 is the lower one. Systems so far apart have
  // their maxima where X = m of their own (van Genuchten's derivation).
  const Durner dry({{0.0001, 100.0, 3.0}, {0.9999, 0.1, 3.0}});
  CHECK(dry.steepest_head() == Approx(-10 * std::pow(2.0 / 3.0, 1.0 / 3.0)).epsilon(1e-5));
}

TEST_CASE("Durner: beyond a plateau of saturation the drier maximum counts", "[soil]") {
  // Half the pores empty at 1 cm, the others at 10 m. Far between, dSe/d ln|h| is about
  // 0.5 x 2 (100 |h|)^-2 + 0.5 x 2 (0.1 |h|)^3: by hand 5e-4 at 60 cm, below the 1e-3 allowed.
  const Durner apart({{0.5, 100.0, 3.0}, {0.5, 0.1, 3.0}});
  CHECK(apart.steepest_head() == Approx(-10 * std::pow(2.0 / 3.0, 1.0 / 3.0)).epsilon(1e-5));
  // The others at 2 m: (100 |h|)^-2 + (0.5 |h|)^3 is least at 22 cm, 3.4e-3: no plateau.
  const Durner near({{0.5, 100.0, 3.0}, {0.5, 0.5, 3.0}});
  CHECK(near.steepest_head() == Approx(-0.01 * std::pow(2.0 / 3.0, 1.0 / 3.0)).epsilon(1e-4));
}

TEST_CASE("Durner: the steepest head as two systems merge", "[soil]") {
  for (const double share : {0.02, 0.2, 0.5, 0.8}) {
    for (double ratio = 30.0; ratio > 1.0; ratio = ratio > 1.01 ? 1.0 + (ratio - 1.0) * 0.8 : 1.0) {
      INFO("share " << share << " ratio " << ratio);
      const Durner curves({{share, 3.0 * ratio, 2.5}, {1.0 - share, 3.0, 2.5}});
      const double h = curves.steepest_head();
      CHECK(is_maximum(curves, h));
      CHECK(curves.saturation_slope(h) >= largest_slope(curves) * (1 - 1e-12));
    }
  }
}

TEST_CASE("Durner: an entry head drier than the wet maximum", "[soil]") {
  const std::vector<PoreSystem> systems{{0.5, 100.0, 3.0}, {0.5, 0.5, 3.0}};
  const Durner still_steep(systems, 0.5, -0.02);
  CHECK(still_steep.steepest_head() == Approx(-0.02).epsilon(1e-15));
  CHECK(still_steep.steepest_head() <= still_steep.entry_head());
  // at 1 m the wet system is empty: the dry one's own maximum, at X = m
  const Durner dry_one(systems, 0.5, -1.0);
  CHECK(dry_one.steepest_head() == Approx(-2.0 * std::pow(2.0 / 3.0, 1.0 / 3.0)).epsilon(1e-4));
  const Durner none(systems, 0.5, -20.0);
  CHECK(none.steepest_head() == -20.0);
}

TEST_CASE("Durner: parameters out of range are refused", "[soil]") {
  const double nan = std::numeric_limits<double>::quiet_NaN();
  CHECK_THROWS_AS(Durner({}), std::invalid_argument);
  CHECK_THROWS_AS(Durner({{0.5, 1.0, 2.0}, {0.4, 1.0, 2.0}}), std::invalid_argument);
  CHECK_THROWS_AS(Durner({{1.2, 1.0, 2.0}, {-0.2, 1.0, 2.0}}), std::invalid_argument);
  CHECK_THROWS_AS(Durner({{1.0, 0.0, 2.0}}), std::invalid_argument);
  CHECK_THROWS_AS(Durner({{1.0, 1.0, 1.0}}), std::invalid_argument);
  CHECK_THROWS_AS(Durner({{1.0, 1.0, nan}}), std::invalid_argument);
  CHECK_THROWS_AS(Durner({{1.0, 1.0, 2.0}}, -2.0), std::invalid_argument);
  CHECK_THROWS_AS(Durner({{1.0, 1.0, 2.0}}, 0.5, 0.01), std::invalid_argument);
  CHECK_NOTHROW(Durner({{0.4000001, 1.0, 2.0}, {0.6, 3.0, 2.0}}));
}

TEST_CASE("Durner: a line for provenance names every parameter", "[soil]") {
  CHECK(two_systems(-0.02).describe() ==
        "Durner - Mualem: weight 0.4, alpha 20 1/m, n 2.1; weight 0.6, alpha 0.5 1/m, n 1.4; l "
        "0.5, minimum capillary height -0.02 m");
}
