#include "models/water/surface_tension.hpp"

#include <catch2/catch.hpp>
#include <cmath>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("surface tension: tabled values and another equation", "[water]") {
  // Vargaftik, Volkov & Voljak 1983, J. Phys. Chem. Ref. Data 12:817 (values from memory): 75.65
  // mN/m at 0.01, 72.75 at 20, 58.91 at 100 degC; their uncertainty is 0.5 %.
  CHECK(water_surface_tension(0.01) == Approx(75.65e-3).margin(0.02e-3));
  CHECK(water_surface_tension(20.0) == Approx(72.75e-3).margin(0.02e-3));
  CHECK(water_surface_tension(100.0) == Approx(58.91e-3).margin(0.02e-3));
  // Patek et al. 2016, J. Chem. Eng. Data (abstract): c (1 - b tau) tau^a in the order
  // 233.58 mN/m, 0.61594, 1.2527; worst error of the recommended values 0.1 mN/m.
  for (const double t : {0.0, 10.0, 20.0, 30.0, 40.0}) {
    const double tau = 1.0 - (t + 273.15) / 647.096;
    CHECK(water_surface_tension(t) ==
          Approx(0.23358 * std::pow(tau, 1.2527) * (1 - 0.61594 * tau)).margin(1e-4));
  }
}

TEST_CASE("surface tension: refused outside the range", "[water]") {
  CHECK_THROWS_AS(water_surface_tension(293.15), std::invalid_argument);
  CHECK_THROWS_AS(water_surface_tension(-26.0), std::invalid_argument);
}
