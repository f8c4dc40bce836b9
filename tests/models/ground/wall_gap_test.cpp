#include "models/ground/wall_gap.hpp"

#include <catch2/catch.hpp>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("wall gap: conductivity of two plates", "[ground]") {
  // Derivation, plane Poiseuille flow at 20 degC with round values: 998.2 x 9.807 x (1e-4)^2 /
  // (12 x 1.0016e-3) = 8.145e-3 m/s for a gap of 0.1 mm.
  CHECK(wall_gap_material(1e-4).Ks == Approx(8.145e-3).epsilon(2e-4));
  CHECK(wall_gap_material(2e-4).Ks == Approx(4 * wall_gap_material(1e-4).Ks).epsilon(1e-13));
  // Water at 0 degC is 1.789 times as viscous (IAPWS 2008, from memory).
  CHECK(wall_gap_material(1e-4, 1.789).Ks == Approx(8.145e-3 / 1.789).epsilon(2e-4));
}

TEST_CASE("wall gap: water between two plates is held by twice its surface tension over the width",
          "[ground]") {
  // Jurin's rise between plates at 20 degC, derivation with round values: 2 x 0.07275 /
  // (998.2 x 9.807 x 1e-3) = 14.86 mm for 1 mm. The rise in a tube as wide is twice that, 29.7 mm.
  const Soil gap = wall_gap_material(1e-3);
  CHECK(gap.curves->entry_head() == Approx(-0.01486).margin(1e-5));
  CHECK(wall_gap_material(1e-4).curves->entry_head() == Approx(-0.1486).margin(1e-4));
  CHECK(gap.conductivity(-0.0148) == gap.Ks);
}

TEST_CASE("wall gap: it is nothing but water, and soon empty above its suction", "[ground]") {
  const Soil gap = wall_gap_material(1e-3);
  CHECK(gap.theta_r == 0.0);
  CHECK(gap.water_content(0.0) == 1.0);
  const double twice = 2 * gap.curves->entry_head();
  CHECK(gap.water_content(twice) < 0.2);
  CHECK(gap.conductivity(twice) < 0.01 * gap.Ks);
}

TEST_CASE("wall gap: an impossible gap is refused", "[ground]") {
  CHECK_THROWS_AS(wall_gap_material(0.0), std::invalid_argument);
  CHECK_THROWS_AS(wall_gap_material(-1e-3), std::invalid_argument);
  CHECK_THROWS_AS(wall_gap_material(1e-3, 0.0), std::invalid_argument);
}
