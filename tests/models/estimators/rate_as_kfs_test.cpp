#include "models/estimators/rate_as_kfs.hpp"

#include <catch2/catch.hpp>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("rate as Kfs: the rate, whatever the ring", "[estimators]") {
  CHECK(rate_as_kfs({3e-6, 0.05, 0.10, 0.05}) == 3e-6);
  CHECK(rate_as_kfs({3e-6, 0.30, 0.20, 0.00}) == 3e-6);
  CHECK_THROWS_AS(rate_as_kfs({-1e-6, 0.05, 0.10, 0.05}), std::invalid_argument);
}
