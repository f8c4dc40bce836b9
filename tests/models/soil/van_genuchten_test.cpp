#include "models/soil/van_genuchten.hpp"

#include <catch2/catch.hpp>
#include <cmath>
#include <limits>

using namespace ringwright::models;

namespace {

// alpha [1/cm], n, h_s [cm], h [cm] -> Se, Kr, integral of Kr from minus infinity to h [cm].
struct Point {
  double alpha, n, h_s, h, Se, Kr, potential;
};

// Computed for this project by an independent prototype: the textbook forms of van Genuchten 1980
// and Vogel et al. 2001, as printed in the header, with 120 digits in Python's mpmath, and
// its quadrature over ln|h|.
constexpr Point kPoints[] = {
    {.008, 1.09, 0, -3, 0.99859640387486, 0.081822414853929, 2.0844824789019},
    {.008, 1.09, 0, -100, 0.95332446698697, 0.0042055862277221, 0.5335076555866},
    {.008, 1.09, 0, -1e4, 0.6736293643957, 3.9369401547264e-7, 0.003228132033367},
    {.008, 1.09, 0, -1e7, 0.36201097647442, 8.3995224132217e-14, 6.8567694089456e-7},
    {.008, 1.09, -2, -3, 0.99950111454404, 0.84426373805338, 21.508201300173},
    {.008, 1.09, -2, -100, 0.95418816208254, 0.04339426984233, 5.5048627981678},
    {.008, 1.09, -2, -1e4, 0.67423966067824, 4.0622313793299e-6, 0.033308657808325},
    {.008, 1.09, -2, -1e7, 0.36233895201239, 8.6668331692599e-13, 7.0749827935304e-6},
    {.036, 1.56, -2, -3, 0.99490855261467, 0.85655991474958, 8.2559204140533},
    {.036, 1.56, -2, -100, 0.46903055204797, 0.0022859161650019, 0.10285774290255},
    {.036, 1.56, -2, -1e4, 0.037239656977631, 4.4100794446008e-10, 1.8376476294031e-6},
    {.036, 1.56, -2, -1e7, 0.00077807543431959, 2.7830122722536e-20, 1.1595884482824e-13},
    {.145, 2.68, 0, -3, 0.93803292821168, 0.57173983266584, 1.3232337256704},
    {.145, 2.68, 0, -100, 0.011186435042834, 2.472960560897e-8, 4.7581152668664e-7},
    {.145, 2.68, 0, -1e4, 4.8854183051243e-6, 9.8597830423279e-21, 1.8961121277404e-17},
    {.145, 2.68, 0, -1e7, 4.4555544584716e-11, 2.476665540356e-39, 4.7628183468385e-33},
};

}  // namespace

TEST_CASE("van Genuchten: values keep their digits at any suction", "[soil]") {
  for (const Point& point : kPoints) {
    INFO("alpha " << point.alpha << " n " << point.n << " h_s " << point.h_s << " h " << point.h);
    const VanGenuchten curves(100 * point.alpha, point.n, 0.5, point.h_s / 100);
    const double h = point.h / 100;
    CHECK(curves.saturation(h) == Approx(point.Se).epsilon(1e-12));
    CHECK(curves.relative_conductivity(h) == Approx(point.Kr).epsilon(1e-12));
    CHECK(curves.relative_flux_potential(h) == Approx(point.potential / 100).epsilon(1e-11));
  }
}

TEST_CASE("van Genuchten: water contents and conductivity printed for a known column", "[soil]") {
  // Celia, Bouloutas & Zarba 1990, Water Resour. Res. 26:1483: alpha 0.0335 1/cm, n 2, theta_r
  // 0.102, theta_s 0.368, Ks 0.00922 cm/s. The three values: computed for this project by an
  // independent prototype, six and five digits.
  const Soil soil{std::make_shared<VanGenuchten>(3.35, 2.0), 0.102, 0.368, 9.22e-5, 0.0};
  CHECK(soil.water_content(-10.0) == Approx(0.109937).margin(5e-7));
  CHECK(soil.water_content(-0.75) == Approx(0.200366).margin(5e-7));
  CHECK(soil.conductivity(-0.75) == Approx(2.8174e-7).margin(5e-12));
}

TEST_CASE("van Genuchten: steepest where X = m, or at the entry head", "[soil]") {
  // Derivation: d/dh of X^m (1 + X)^-(m+1) vanishes at X = m.
  const VanGenuchten free(3.6, 1.56);
  const double m = 1 - 1 / 1.56;
  CHECK(std::pow(3.6 * -free.steepest_head(), 1.56) == Approx(m).epsilon(1e-13));
  CHECK(VanGenuchten(14.5, 2.68, 0.5, -0.2).steepest_head() == -0.2);
}

TEST_CASE("van Genuchten: parameters out of range are refused", "[soil]") {
  const double nan = std::numeric_limits<double>::quiet_NaN();
  CHECK_THROWS_AS(VanGenuchten(0.0, 1.5), std::invalid_argument);
  CHECK_THROWS_AS(VanGenuchten(-1.0, 1.5), std::invalid_argument);
  CHECK_THROWS_AS(VanGenuchten(1.0, 1.0), std::invalid_argument);
  CHECK_THROWS_AS(VanGenuchten(1.0, nan), std::invalid_argument);
  CHECK_THROWS_AS(VanGenuchten(1.0, 1.5, -2.0), std::invalid_argument);
  CHECK_THROWS_AS(VanGenuchten(1.0, 1.5, 0.5, 0.01), std::invalid_argument);
  CHECK_NOTHROW(VanGenuchten(1.0, 1.5, -1.9, 0.0));
}

TEST_CASE("van Genuchten: a line for provenance names every parameter", "[soil]") {
  CHECK(VanGenuchten(3.6, 1.56, 0.5, -0.02).describe() ==
        "van Genuchten - Mualem: alpha 3.6 1/m, n 1.56, l 0.5, minimum capillary height -0.02 m");
}
