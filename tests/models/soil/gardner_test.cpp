#include "models/soil/gardner.hpp"

#include <catch2/catch.hpp>
#include <cmath>

using namespace ringwright::models;

TEST_CASE("Gardner: exponential below 0, potential K/alpha", "[soil]") {
  // Gardner 1958, Soil Sci. 85:228; the integral of exp(alpha h) is exp(alpha h)/alpha.
  const Gardner curves(12.0);
  CHECK(curves.relative_conductivity(-0.25) == Approx(std::exp(-3.0)).epsilon(1e-15));
  CHECK(curves.saturation(-0.25) == Approx(std::exp(-3.0)).epsilon(1e-15));
  CHECK(curves.relative_flux_potential(-0.25) == Approx(std::exp(-3.0) / 12.0).epsilon(1e-15));
  CHECK(curves.relative_flux_potential(0.1) == Approx(1.0 / 12.0 + 0.1).epsilon(1e-15));
  CHECK(curves.steepest_head() == 0.0);
  CHECK(curves.describe() == "Gardner: alpha 12 1/m");
  CHECK_THROWS_AS(Gardner(0.0), std::invalid_argument);
}
