#include "models/ring/lid_lift.hpp"

#include <catch2/catch.hpp>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("lid: force of a head on an area", "[ring]") {
  // By hand, rho g pi a^2 H with 998.2 x 9.807 to the digits given: radius 7.2 cm at 5, 10, 20, 50
  // cm; 10 cm at 5, 10, 20, 50 cm; 15 cm at 5, 10, 20, 50 cm [N].
  CHECK(lid_force(0.05, 0.072) == Approx(8.0).margin(0.05));
  CHECK(lid_force(0.10, 0.072) == Approx(16.0).margin(0.06));
  CHECK(lid_force(0.20, 0.072) == Approx(32.0).margin(0.12));
  CHECK(lid_force(0.50, 0.072) == Approx(79.9).margin(0.2));
  CHECK(lid_force(0.05, 0.10) == Approx(15.4).margin(0.06));
  CHECK(lid_force(0.50, 0.10) == Approx(154).margin(0.5));
  CHECK(lid_force(0.05, 0.15) == Approx(34.7).margin(0.12));
  CHECK(lid_force(0.50, 0.15) == Approx(347).margin(1.2));
  // and ring diameters 20, 30, 60 cm at 1 and 1.5 m: 308, 462; 693, 1040; 2.8 and 4.2 kN
  CHECK(lid_force(1.0, 0.10) == Approx(308).margin(1));
  CHECK(lid_force(1.5, 0.10) == Approx(462).margin(1));
  CHECK(lid_force(1.0, 0.15) == Approx(693).margin(2));
  CHECK(lid_force(1.5, 0.15) == Approx(1040).margin(3));
  CHECK(lid_force(1.0, 0.30) == Approx(2.8e3).margin(50));
  CHECK(lid_force(1.5, 0.30) == Approx(4.2e3).margin(50));
}

TEST_CASE("lid: ballast is 1.5 times the lift less what lies there, in pieces to lift", "[ring]") {
  // By hand: 462 N are 47.1 kg, 1.5 times that 70.7 kg; less 11 kg: 59.7 kg, three pieces.
  CHECK(ballast_mass(462.0, 0.0) == Approx(70.7).margin(0.05));
  CHECK(ballast_mass(462.0, 11.0) == Approx(59.7).margin(0.05));
  CHECK(ballast_mass(10.0, 11.0) == 0.0);
  CHECK(ballast_pieces(59.7) == 3);
  CHECK(ballast_pieces(60.0) == 3);
  CHECK(ballast_pieces(60.1) == 4);
  CHECK(ballast_pieces(0.0) == 0);
}

TEST_CASE("lid: the highest head and the seal count, not the set head and the bore", "[ring]") {
  Lid lid;
  lid.weight = 5.0;
  const LidLift bore = lid_lift(lid, 1.0, 0.10);
  CHECK(bore.force == Approx(308).margin(1));
  CHECK(bore.net_force == Approx(308 - 5 * 9.807).margin(1));
  lid.seal_radius = 0.12;  // (12/10)^2 = 1.44 times
  CHECK(lid_lift(lid, 1.0, 0.10).force == Approx(1.44 * bore.force).epsilon(1e-12));
  CHECK(lid_lift(lid, 2.0, 0.10).force == Approx(2.88 * bore.force).epsilon(1e-12));
  // 1.5 x 443.0 N / 9.807 - 5 kg = 62.8 kg
  CHECK(lid_lift(lid, 1.0, 0.10).ballast == Approx(62.8).margin(0.1));
  CHECK(lid_lift(lid, 1.0, 0.10).pieces == 4);
  lid.underside = 0.20;  // water only reaches the lid at 20 cm
  CHECK(lid_lift(lid, 1.0, 0.10).force == Approx(0.8 * 1.44 * bore.force).epsilon(1e-12));
  CHECK(lid_lift(lid, 0.15, 0.10).force == 0.0);
  CHECK(lid_lift(lid, 0.15, 0.10).net_force < 0.0);
}

TEST_CASE("lid: safe only if relief and rating are stated and fit", "[ring]") {
  Lid lid;
  CHECK_FALSE(is_stated_safe(lid));
  lid.relief_head = 1.0;
  CHECK_FALSE(is_stated_safe(lid));
  lid.rating = 0.9;
  CHECK_FALSE(is_stated_safe(lid));
  lid.rating = 1.0;
  CHECK(is_stated_safe(lid));
  lid.relief_head.reset();
  CHECK_FALSE(is_stated_safe(lid));
}

TEST_CASE("lid: impossible values are refused", "[ring]") {
  CHECK_THROWS_AS(lid_force(-0.1, 0.1), std::invalid_argument);
  CHECK_THROWS_AS(lid_force(0.1, 0.0), std::invalid_argument);
  CHECK_THROWS_AS(ballast_mass(10.0, 0.0, 0.9), std::invalid_argument);
  Lid lid;
  lid.seal_radius = 0.09;
  CHECK_THROWS_AS(lid_lift(lid, 1.0, 0.10), std::invalid_argument);
}
