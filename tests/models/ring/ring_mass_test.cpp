#include "models/ring/ring_mass.hpp"

#include <catch2/catch.hpp>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("ring mass: rings of 60 and 30 cm", "[ring]") {
  // By hand with the developed wall, 7850 x pi D s h: 60 cm x 50 cm x 3 mm 22.2 kg, 30 cm 11.1 kg;
  // the wall's own thickness adds 0.5 and 1 %.
  CHECK(ring_mass(0.30, 0.003, 0.50) == Approx(22.2 * 1.005).epsilon(2e-3));
  CHECK(ring_mass(0.15, 0.003, 0.50) == Approx(11.1 * 1.01).epsilon(2e-3));
  // aluminium, by hand: 2700 x pi x 0.303 x 0.003 x 0.5 = 3.86 kg
  CHECK(ring_mass(0.15, 0.003, 0.50, aluminium_density) == Approx(3.86).margin(0.01));
}

TEST_CASE("ring mass: impossible rings are refused", "[ring]") {
  CHECK_THROWS_AS(ring_mass(0.0, 0.003, 0.5), std::invalid_argument);
  CHECK_THROWS_AS(ring_mass(0.15, 0.0, 0.5), std::invalid_argument);
  CHECK_THROWS_AS(ring_mass(0.15, 0.003, -0.5), std::invalid_argument);
}
