#include "models/ring/sealed_volume.hpp"

#include <catch2/catch.hpp>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("sealed volume: 225 litres at 20 degC", "[ring]") {
  // By hand with 2.07e-4 per degree (physics handbooks, from memory): 46.6 mL; with the usual
  // rounded 2.1e-4, 47 mL.
  CHECK(sealed_volume_per_degree(0.225, 20.0) * 1e6 == Approx(46.6).margin(0.3));
  CHECK(sealed_volume_per_degree(0.225, 20.0) * 1e6 == Approx(47).margin(1.2));
  CHECK(sealed_volume_per_degree(0.225, 10.0) * 1e6 == Approx(19.8).margin(0.3));  // 0.88e-4
  CHECK(sealed_volume_per_degree(0.225, 2.0) < 0.0);
}

TEST_CASE("sealed volume: swing that spoils a daily reading", "[ring]") {
  // 146 mL a day out of 225 L at 20 degC, 10 %: 14.6 mL over 46.6 mL per degree = 0.31 K.
  const double flow = 146e-6 / 86400;
  CHECK(allowable_temperature_swing(0.225, 20.0, flow, 86400, 0.1) == Approx(0.31).margin(0.005));
  // Cold water shrinks as it warms; by hand from densities 999.84 at 0 and 999.94 at 2 degC (CRC
  // Handbook, from memory): 5e-5 per degree, 11.2 mL, 1.3 K.
  CHECK(allowable_temperature_swing(0.225, 1.0, flow, 86400, 0.1) == Approx(1.3).margin(0.1));
}

TEST_CASE("sealed volume: values out of range are refused", "[ring]") {
  CHECK_THROWS_AS(sealed_volume_per_degree(-1.0, 20.0), std::invalid_argument);
  CHECK_THROWS_AS(sealed_volume_per_degree(0.2, 60.0), std::invalid_argument);
  CHECK_THROWS_AS(allowable_temperature_swing(0.2, 20.0, 0.0, 1.0, 0.1), std::invalid_argument);
}
