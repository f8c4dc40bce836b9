#include "models/soil/capillary_length.hpp"

#include <catch2/catch.hpp>
#include <cmath>

#include "models/soil/catalogue.hpp"
#include "models/soil/gardner.hpp"

using namespace ringwright::models;

namespace {

// Capillary lengths [cm] of the class means of Carsel & Parrish 1988 with l = 0.5, and of the
// class averages of Schaap et al. 2001: computed for this project by an independent prototype
// (adaptive quadrature), printed to the digits below.
struct Row {
  std::string_view texture;
  double dry, from_300, from_100;  // h_s = 0
  double h_s_1, h_s_2, h_s_5;      // dry
  double schaap_0, schaap_2;       // dry, h_s 0 and -2 cm
};

constexpr Row kTable[] = {
    {"sand", 3.808, 3.808, 3.808, 4.08, 4.61, 7.05, 17.6, 17.7},
    {"loamy sand", 3.840, 3.840, 3.840, 4.35, 5.07, 7.78, 9.3, 12.2},
    {"sandy loam", 4.967, 4.967, 4.965, 6.03, 7.02, 10.12, 7.4, 13.4},
    {"loam", 6.920, 6.916, 6.869, 9.57, 11.18, 15.37, 18.8, 26.8},
    {"silt", 9.931, 9.832, 9.357, 16.02, 18.68, 24.81, 45.3, 50.5},
    {"silt loam", 8.952, 8.903, 8.620, 13.87, 16.20, 21.71, 57.8, 63.6},
    {"sandy clay loam", 3.608, 3.607, 3.594, 6.29, 7.89, 12.16, 6.6, 15.0},
    {"clay loam", 6.728, 6.661, 6.367, 13.23, 15.95, 22.21, 11.5, 19.4},
    {"silty clay loam", 8.574, 8.254, 7.377, 19.87, 23.76, 32.19, 27.6, 35.4},
    {"sandy clay", 3.175, 3.147, 3.039, 9.63, 12.28, 18.55, 2.2, 10.8},
    {"silty clay", 3.919, 3.429, 2.740, 26.92, 33.24, 46.31, 8.3, 18.0},
    {"clay", 2.450, 2.256, 1.924, 19.35, 24.42, 35.27, 6.5, 18.2},
};

// Half a unit of the last digit, and a little for a value printed exactly between two.
constexpr double kThree = 0.00055;
constexpr double kTwo = 0.0055;
constexpr double kOne = 0.055;

double cm(const Soil& soil) { return 100 * capillary_length(*soil.curves); }
double cm(const Soil& soil, double h_i) { return 100 * capillary_length(*soil.curves, h_i); }

}  // namespace

TEST_CASE("capillary length: published classes, dry and moist, with and without h_s", "[soil]") {
  for (const Row& row : kTable) {
    INFO(row.texture);
    const auto rows = published_soils_of(row.texture);
    const Soil bare = make_soil(rows[0], 0.0);
    CHECK(cm(bare) == Approx(row.dry).margin(kThree));
    CHECK(cm(bare, -3.0) == Approx(row.from_300).margin(kThree));
    CHECK(cm(bare, -1.0) == Approx(row.from_100).margin(kThree));
    CHECK(cm(make_soil(rows[0], -0.01)) == Approx(row.h_s_1).margin(kTwo));
    CHECK(cm(make_soil(rows[0], -0.02)) == Approx(row.h_s_2).margin(kTwo));
    CHECK(cm(make_soil(rows[0], -0.05)) == Approx(row.h_s_5).margin(kTwo));
    CHECK(cm(make_soil(rows[1], 0.0)) == Approx(row.schaap_0).margin(kOne));
    CHECK(cm(make_soil(rows[1], -0.02)) == Approx(row.schaap_2).margin(kOne));
  }
}

TEST_CASE("capillary length: 1/alpha for a Gardner soil from any start", "[soil]") {
  // By integration: (1 - exp(alpha h_i))/alpha over 1 - exp(alpha h_i).
  const Gardner curves(12.0);
  CHECK(capillary_length(curves) == Approx(1 / 12.0).epsilon(1e-15));
  for (const double h_i : {-100.0, -1.0, -0.1, -0.01}) {
    CHECK(capillary_length(curves, h_i) == Approx(1 / 12.0).epsilon(1e-12));
  }
}

TEST_CASE("capillary length: above what the soil conducts already", "[soil]") {
  // By integration: 1/alpha - |h_i| Kr_i/(1 - Kr_i).
  const Gardner curves(12.0);
  const double Kr = std::exp(-12 * 0.1);
  CHECK(capillary_length_above_initial(curves, -0.1) ==
        Approx(1 / 12.0 - 0.1 * Kr / (1 - Kr)).epsilon(1e-12));
  CHECK(capillary_length_above_initial(curves, -100.0) == Approx(1 / 12.0).epsilon(1e-12));
}

TEST_CASE("capillary length: a saturated start is refused", "[soil]") {
  CHECK_THROWS_AS(capillary_length(Gardner(12.0), 0.0), std::invalid_argument);
  const Soil loam = make_soil(published_soils_of("loam")[0]);
  CHECK_THROWS_AS(capillary_length(*loam.curves, -0.02), std::invalid_argument);
  CHECK_THROWS_AS(capillary_length_above_initial(*loam.curves, -0.01), std::invalid_argument);
}
