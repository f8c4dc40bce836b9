#include "models/water/viscosity.hpp"

#include <catch2/catch.hpp>
#include <limits>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("viscosity: water at 20 degC and the ratio at 0 degC", "[water]") {
  // IAPWS 2008, liquid water at 0.1 MPa: 1.0016 mPa s at 20 degC, 1.789 for 0/20 degC (both from
  // memory).
  CHECK(water_viscosity(20.0) == Approx(1.0016e-3).margin(5e-8));
  CHECK(viscosity_ratio(0.0) == Approx(1.789).margin(5e-4));
  CHECK(viscosity_ratio(20.0) == 1.0);
}

TEST_CASE("viscosity: ratios near another formula", "[water]") {
  // mu = 2.414e-5 10^(247.8/(T_K - 140)) Pa s (Al-Shemmeri 2012 and others, from memory)
  // gives 1.297 at 10, 1.134 at 15, 0.889 at 25 and 0.796 at 30 degC, itself good to about 1 %.
  CHECK(viscosity_ratio(10.0) == Approx(1.297).epsilon(0.01));
  CHECK(viscosity_ratio(15.0) == Approx(1.134).epsilon(0.01));
  CHECK(viscosity_ratio(25.0) == Approx(0.889).epsilon(0.01));
  CHECK(viscosity_ratio(30.0) == Approx(0.796).epsilon(0.01));
}

TEST_CASE("viscosity: falls with temperature, refused outside the formula's range", "[water]") {
  for (double T = 0.0; T < 50.0; T += 1.0) CHECK(water_viscosity(T + 1) < water_viscosity(T));
  CHECK_THROWS_AS(water_viscosity(-20.1), std::invalid_argument);
  CHECK_THROWS_AS(water_viscosity(293.15), std::invalid_argument);  // kelvin by mistake
  CHECK_THROWS_AS(water_viscosity(std::numeric_limits<double>::quiet_NaN()), std::invalid_argument);
}
