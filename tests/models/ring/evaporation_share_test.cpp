#include "models/ring/evaporation_share.hpp"

#include <catch2/catch.hpp>
#include <cmath>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("evaporation: 5 mm a day beside the rate", "[ring]") {
  // By hand: 5 mm/d = 5.8e-8 m/s is 0.06 of 1e-6, 0.6 of 1e-7, 5.8 of 1e-8, 58 of 1e-9 m/s.
  const double E = 0.005 / 86400;
  CHECK(evaporation_share(E, 1e-6) == Approx(0.058).margin(0.0005));
  CHECK(evaporation_share(E, 1e-7) == Approx(0.58).margin(0.005));
  CHECK(evaporation_share(E, 1e-8) == Approx(5.8).margin(0.05));
  CHECK(evaporation_share(E, 1e-9) == Approx(58).margin(0.5));
  CHECK(evaporation_share(E, 1e-6) < largest_evaporation_share);
  CHECK(evaporation_share(E, 1e-7) > largest_evaporation_share);
}

TEST_CASE("evaporation: none, none into the soil, and impossible values", "[ring]") {
  CHECK(evaporation_share(0.0, 0.0) == 0.0);
  CHECK(std::isinf(evaporation_share(1e-8, 0.0)));
  CHECK_THROWS_AS(evaporation_share(-1e-8, 1e-6), std::invalid_argument);
  CHECK_THROWS_AS(evaporation_share(1e-8, -1e-6), std::invalid_argument);
}
