#include "models/ground/piping.hpp"

#include <catch2/catch.hpp>
#include <cmath>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("piping: index of a lidded ring", "[ground]") {
  // By hand: 1.5 m over 10 cm is 7.5, over 20 cm 3.75.
  CHECK(piping_index(1.5, 0.10) == Approx(7.5));
  CHECK(piping_index(1.5, 0.20) == Approx(3.75));
  CHECK(piping_index(0.0, 0.0) == 0.0);
  CHECK(std::isinf(piping_index(0.1, 0.0)));
}

TEST_CASE("piping: critical gradient of sand", "[ground]") {
  // Textbooks: quartz sand at a porosity of 0.40 to 0.45, 0.9 to 1.0 (from memory); by hand
  // (2.65/0.9982 - 1) x 0.6 = 0.993, x 0.55 = 0.910.
  CHECK(critical_exit_gradient(0.40) == Approx(0.993).margin(0.001));
  CHECK(critical_exit_gradient(0.45) == Approx(0.910).margin(0.001));
}

TEST_CASE("fracture: head that lifts the soil above the foot of the wall", "[ground]") {
  // By hand: H = d (rho_b/rho_w - 1), 0.3 to 0.9 d for 1.3 to 1.9 g/cm3.
  CHECK(fracture_head(0.10, 1300) == Approx(0.030).margin(0.0005));
  CHECK(fracture_head(0.10, 1900) == Approx(0.090).margin(0.0005));
  CHECK(fracture_head(0.10, 900) == 0.0);
  CHECK(fracture_margin(fracture_head(0.10, 1700), 0.10, 1700) == Approx(1.0).epsilon(1e-13));
  // 10 cm of soil at 1.6 against 60 cm of water: 160/599 = 0.267
  CHECK(fracture_margin(0.50, 0.10, 1600) == Approx(0.267).margin(0.001));
  CHECK(fracture_margin(0.0, 0.10, 1600) == Approx(1.603).margin(0.001));
}

TEST_CASE("piping and fracture: impossible values are refused", "[ground]") {
  CHECK_THROWS_AS(piping_index(-0.1, 0.1), std::invalid_argument);
  CHECK_THROWS_AS(piping_index(0.1, -0.1), std::invalid_argument);
  CHECK_THROWS_AS(critical_exit_gradient(40.0), std::invalid_argument);  // percent by mistake
  CHECK_THROWS_AS(critical_exit_gradient(0.4, 0.0), std::invalid_argument);
  CHECK_THROWS_AS(fracture_margin(0.1, 0.1, -1.0), std::invalid_argument);
}
