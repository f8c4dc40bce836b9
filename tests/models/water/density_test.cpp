#include "models/water/density.hpp"

#include <catch2/catch.hpp>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("density: tabled values", "[water]") {
  // CRC Handbook of Chemistry and Physics, density of water 0.1 to 100 degC (from memory): 0.99985
  // at 0.1, 0.99970 at 10, 0.99821 at 20, 0.99565 at 30 g/mL.
  CHECK(water_density(0.1) == Approx(999.85).margin(0.005));
  CHECK(water_density(10.0) == Approx(999.70).margin(0.005));
  CHECK(water_density(20.0) == Approx(998.21).margin(0.005));
  CHECK(water_density(30.0) == Approx(995.65).margin(0.005));
  CHECK(water_density(3.983035) == Approx(999.97495).epsilon(1e-12));
}

TEST_CASE("density: expansion is the slope, and near the tabled figures", "[water]") {
  for (const double t : {2.0, 10.0, 20.0, 35.0}) {
    const double e = 1e-3;
    const double slope = (water_density(t + e) - water_density(t - e)) / (2 * e);
    CHECK(water_expansion(t) == Approx(-slope / water_density(t)).epsilon(1e-6).margin(1e-12));
  }
  // 2.07e-4 per K at 20 and 0.88e-4 at 10 degC (physics handbooks, from memory).
  CHECK(water_expansion(20.0) == Approx(2.07e-4).margin(0.01e-4));
  CHECK(water_expansion(10.0) == Approx(0.88e-4).margin(0.01e-4));
  CHECK(water_expansion(1.0) < 0.0);
  CHECK(water_expansion(3.983035) == Approx(0.0).margin(1e-12));
}

TEST_CASE("density: refused outside the formula's range", "[water]") {
  CHECK_THROWS_AS(water_density(-0.1), std::invalid_argument);
  CHECK_THROWS_AS(water_expansion(40.1), std::invalid_argument);
  CHECK_THROWS_AS(water_density(293.15), std::invalid_argument);  // kelvin by mistake
}
