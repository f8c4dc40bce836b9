#include "models/soil/soil_from_capillary_length.hpp"

#include <catch2/catch.hpp>

#include "models/soil/capillary_length.hpp"
#include "models/soil/catalogue.hpp"

using namespace ringwright::models;

TEST_CASE("soil by capillary length: length and fillable pores are those given", "[soil]") {
  for (const double h_i : {-30.0, -3.0, -0.6}) {
    const Soil soil = soil_from_capillary_length(0.25, 0.3, 1e-6, h_i);
    CHECK(capillary_length(*soil.curves) == Approx(0.25).epsilon(1e-14));
    CHECK(soil.theta_s - soil.water_content(h_i) == Approx(0.3).epsilon(1e-13));
    CHECK(soil.Ks == 1e-6);
  }
}

TEST_CASE("soil by capillary length: what cannot be is refused", "[soil]") {
  CHECK_THROWS_AS(soil_from_capillary_length(0.0, 0.3, 1e-6, -3), std::invalid_argument);
  CHECK_THROWS_AS(soil_from_capillary_length(0.25, 0.0, 1e-6, -3), std::invalid_argument);
  CHECK_THROWS_AS(soil_from_capillary_length(0.25, 0.3, 0.0, -3), std::invalid_argument);
  CHECK_THROWS_AS(soil_from_capillary_length(0.25, 0.3, 1e-6, 0.0), std::invalid_argument);
  // 1 - exp(-0.1) = 0.095 of the pores are empty: 0.3 would need three times the volume.
  CHECK_THROWS_AS(soil_from_capillary_length(1.0, 0.3, 1e-6, -0.1), std::invalid_argument);
}

TEST_CASE("matched Gardner soil: same length, contents and Ks", "[soil]") {
  for (const PublishedSoil& row : published_soils()) {
    const Soil soil = make_soil(row);
    const Soil match = matched_gardner(soil, -3.0);
    CHECK(capillary_length(*match.curves, -3.0) ==
          Approx(capillary_length(*soil.curves, -3.0)).epsilon(1e-12));
    CHECK(match.water_content(-3.0) == Approx(soil.water_content(-3.0)).epsilon(1e-12));
    CHECK(match.theta_s == soil.theta_s);
    CHECK(match.Ks == soil.Ks);
  }
}
