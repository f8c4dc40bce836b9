#include "models/theory/saturated_ring_shape.hpp"

#include <catch2/catch.hpp>
#include <numbers>
#include <stdexcept>

using ringwright::models::saturated_ring_flow_factor;

TEST_CASE("saturated ring: flow factors", "[theory]") {
  // F at d/a 0, 0.25, 1: computed for this project by an independent prototype (finite volumes,
  // extrapolated, +-0.05 %); the closed form is a fit good to 0.14 %.
  CHECK(saturated_ring_flow_factor(0.0) == Approx(4.000).epsilon(0.0019));
  CHECK(saturated_ring_flow_factor(0.25) == Approx(3.165).epsilon(0.0019));
  CHECK(saturated_ring_flow_factor(1.0) == Approx(1.864).epsilon(0.0019));
}

TEST_CASE("saturated ring: deep insertion is a filled tube with an end correction", "[theory]") {
  // Levine & Schwinger 1948, Phys. Rev. 73:383: 0.6133 a for a pipe without flange.
  const double deep = 1e4;
  CHECK(std::numbers::pi / saturated_ring_flow_factor(deep) - deep == Approx(0.6133).margin(2e-5));
  CHECK_THROWS_AS(saturated_ring_flow_factor(-0.1), std::invalid_argument);
}
