#include "models/soil/brooks_corey.hpp"

#include <catch2/catch.hpp>
#include <cmath>

#include "models/soil/capillary_length.hpp"
#include "models/soil/sorptivity.hpp"

using namespace ringwright::models;

TEST_CASE("Brooks-Corey: exponents of Mualem and Burdine", "[soil]") {
  // Brooks & Corey 1964: eta = 3 + 2/L (Burdine); with Mualem 1976 and l = 0.5: 2.5 + 2/L.
  CHECK(BrooksCorey(-0.1, 0.5).exponent() == Approx(6.5));
  CHECK(BrooksCorey::burdine(-0.1, 0.5).exponent() == Approx(7.0));
  CHECK(BrooksCorey::with_exponent(-0.1, 0.5, 4.0).exponent() == 4.0);
  CHECK(BrooksCorey(-0.1, 0.5).saturation(-0.4) == Approx(0.5));  // (1/4)^0.5
  CHECK(BrooksCorey(-0.1, 0.5).relative_conductivity(-0.4) == Approx(std::pow(0.5, 6.5)));
}

TEST_CASE("Brooks-Corey: capillary length", "[soil]") {
  // |h_b| (2 + 3 L)/(1 + 3 L) for Burdine: as used by Rawls, Brakensiek & Miller 1983, J. Hydraul.
  // Eng. 109:62; sand L 0.592, h_b 7.26 cm gives twice its psi_f of 4.95 cm, to the 1.6 % by which
  // that table agrees with the one of Rawls, Brakensiek & Saxton 1982.
  const double lambda = capillary_length(BrooksCorey::burdine(-0.0726, 0.592));
  CHECK(lambda == Approx(0.0726 * (2 + 3 * 0.592) / (1 + 3 * 0.592)).epsilon(1e-13));
  CHECK(lambda / 2 == Approx(0.0495).epsilon(0.016));
}

TEST_CASE("Brooks-Corey: Parlange's sorptivity in closed form", "[soil]") {
  // S^2 = |h_b| Ks dtheta (2 + 1/(L eta - 1) + 1/(L eta + L - 1)) from a dry start: the integral
  // of Parlange 1975, Soil Sci. 119:158, by hand.
  const double L = 0.592;
  const double eta = 3 + 2 / L;
  const Soil soil{std::make_shared<BrooksCorey>(BrooksCorey::burdine(-0.0726, L)), 0.02, 0.437,
                  1e-5, 0.0};
  const double squared = 0.0726 * 1e-5 * 0.417 * (2 + 1 / (L * eta - 1) + 1 / (L * eta + L - 1));
  CHECK(parlange_sorptivity(soil, -1e12) == Approx(std::sqrt(squared)).epsilon(1e-4));
}

TEST_CASE("Brooks-Corey: parameters out of range are refused", "[soil]") {
  CHECK_THROWS_AS(BrooksCorey(0.0, 0.5), std::invalid_argument);
  CHECK_THROWS_AS(BrooksCorey(-0.1, 0.0), std::invalid_argument);
  CHECK_THROWS_AS(BrooksCorey(-0.1, 0.5, -2.0), std::invalid_argument);
  CHECK_THROWS_AS(BrooksCorey::with_exponent(-0.1, 0.5, 2.0), std::invalid_argument);
  CHECK(BrooksCorey::with_exponent(-0.1, 0.5, 4.0).describe() ==
        "Brooks-Corey: entry head -0.1 m, pore size index 0.5, conductivity exponent 4");
}
