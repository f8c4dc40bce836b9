#include "models/theory/saturated_disc.hpp"

#include <catch2/catch.hpp>

TEST_CASE("saturated disc: 4 Ks a H", "[theory]") {
  // Weber's disc; a finite-volume solution, extrapolated, gave 3.9999 (computed for this project
  // by an independent prototype).
  CHECK(ringwright::models::saturated_disc_flow(2e-6, 0.1, 0.05) ==
        Approx(3.9999e-8).epsilon(1e-4));
}
