#include "postprocess/reading/stop_rule.hpp"

#include <catch2/catch.hpp>

using namespace ringwright;
using postprocess::first_steady_reading;

namespace {

// Readings of one minute in a ring of 0.5 m2 with the given rates [m/s].
models::Record record_with(const std::vector<double>& rates) {
  models::Record record;
  record.ring_area = 0.5;
  double time = 0.0, total = 0.0;
  for (double rate : rates) {
    const double volume = rate * 0.5 * 60.0;
    time += 60.0, total += volume;
    record.readings.push_back({time, 60.0, volume, total, 0.05});
  }
  return record;
}

}  // namespace

TEST_CASE("the rule ends a test at the first reading whose last three agree", "[reading]") {
  // 6, 5, 4.9: mean 5.3, 13 % off; 5, 4.9, 5.1: mean 5, 2 % off
  const auto record = record_with({10, 6, 5, 4.9, 5.1, 5.0});
  REQUIRE(first_steady_reading(record, 3, 0.05));
  CHECK(*first_steady_reading(record, 3, 0.05) == 4);
}

TEST_CASE("agreement is with the mean of the readings, not between neighbours", "[reading]") {
  // each 4 % above the one before, the ends 3.9 % off the mean
  const auto drifting = record_with({1.00, 1.04, 1.08});
  CHECK(first_steady_reading(drifting, 3, 0.05));
  CHECK_FALSE(first_steady_reading(drifting, 3, 0.035));
}

TEST_CASE("a rate that crosses the band on its way does not end the test early", "[reading]") {
  const auto record = record_with({8, 4, 2, 1, 1, 1});
  CHECK(first_steady_reading(record, 3, 0.05) == 5);
  CHECK(first_steady_reading(record, 2, 0.05) == 4);
}

TEST_CASE("a rule that is never met gives no reading", "[reading]") {
  CHECK_FALSE(first_steady_reading(record_with({8, 4, 2, 1}), 3, 0.05));
}

TEST_CASE("fewer readings than the rule asks for give no reading", "[reading]") {
  CHECK_FALSE(first_steady_reading(record_with({1, 1}), 3, 0.05));
  CHECK_FALSE(first_steady_reading(record_with({}), 1, 0.05));
  CHECK(first_steady_reading(record_with({1, 1}), 2, 0.05) == 1);
}

TEST_CASE("a short last interval counts by its rate, not by its volume", "[reading]") {
  auto record = record_with({9, 5, 5});
  record.readings.push_back({190.0, 10.0, 5 * 0.5 * 10.0, 0.0, 0.05});
  CHECK(first_steady_reading(record, 3, 0.05) == 3);
}
