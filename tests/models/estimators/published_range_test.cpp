#include "models/estimators/published_range.hpp"

#include <array>
#include <catch2/catch.hpp>
#include <limits>
#include <stdexcept>

using namespace ringwright::models;

TEST_CASE("published range: limits are inclusive, rounding forgiven", "[estimators]") {
  const std::array<PublishedLimit, 2> limits{
      {{"head", 0.05, std::numeric_limits<double>::infinity(), "m"}, {"ratio", 0.25, 1.0, "1"}}};
  CHECK(limits_broken(limits, std::array{0.05, 1.0}).empty());
  CHECK(limits_broken(limits, std::array{0.05 * (1 - 1e-15), 0.25 * (1 - 1e-15)}).empty());
  CHECK(limits_broken(limits, std::array{1e9, 0.5}).empty());
  CHECK(limits_broken(limits, std::array{0.0499, 1.001}).size() == 2);
  CHECK_THROWS_AS(limits_broken(limits, std::array{0.05}), std::invalid_argument);
}
