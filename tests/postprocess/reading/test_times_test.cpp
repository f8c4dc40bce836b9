#include "postprocess/reading/test_times.hpp"

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>

using namespace ringwright::postprocess;

namespace {

constexpr double minute = 60.0, hour = 3600.0;

std::vector<double> rounded(std::vector<double> times) {
  for (double& t : times) t = std::round(t * 1e6) / 1e6;
  return times;
}

}  // namespace

TEST_CASE("readings: every minute in a short test, every 5 % in a long one", "[reading]") {
  CHECK(default_reading_interval(10 * minute) == minute);
  CHECK(default_reading_interval(20 * minute) == Approx(minute));
  CHECK(default_reading_interval(3 * hour) == Approx(9 * minute));
}

TEST_CASE("a test is read at the end of every interval and at its own end", "[reading]") {
  CHECK(rounded(reading_times(300, 1000)) == std::vector<double>{300, 600, 900, 1000});
  CHECK(rounded(reading_times(300, 900)) == std::vector<double>{300, 600, 900});
  CHECK(reading_times(300, 120) == std::vector<double>{120});
  // 3 x 0.1 is not 0.3 in binary: still three readings
  CHECK(reading_times(0.1, 0.3).size() == 3);
  CHECK(reading_times(0.1 * hour, 0.7 * hour).size() == 7);
}

TEST_CASE("stopping times hold a reading and lie within the test", "[reading]") {
  CHECK(stopping_times(9 * minute, 3 * hour) ==
        std::vector<double>{10 * minute, 15 * minute, 30 * minute, hour, 2 * hour, 3 * hour});
  CHECK(stopping_times(minute, minute) == std::vector<double>{minute});
  CHECK(stopping_times(50, 55).empty());
}

TEST_CASE("the ladder has the stop, the longest time and rows around the stop", "[reading]") {
  const double interval = 6 * minute, longest = 8 * hour;
  for (double stop : {12 * minute, 48 * minute, hour, 5 * hour, 8 * hour}) {
    const auto times = ladder_times(interval, stop, longest, 5);
    CAPTURE(stop);
    CHECK(std::is_sorted(times.begin(), times.end()));
    CHECK(std::adjacent_find(times.begin(), times.end()) == times.end());
    CHECK(std::count(times.begin(), times.end(), stop) == 1);
    CHECK(times.back() == longest);
    CHECK(times.front() >= interval);
    CHECK(times.size() >= 3);
    CHECK(times.size() <= 7);
  }
}

TEST_CASE("no row of the ladder nearly repeats the stop or the longest time", "[reading]") {
  const auto times = ladder_times(minute, 58 * minute, 125 * minute, 20);
  CHECK(std::count(times.begin(), times.end(), hour) == 0);
  CHECK(std::count(times.begin(), times.end(), 2 * hour) == 0);
  CHECK(std::count(times.begin(), times.end(), 30 * minute) == 1);
}

TEST_CASE("of many stopping times those nearest to the stop are kept", "[reading]") {
  const auto times = ladder_times(minute, 40 * minute, 8 * hour, 2);
  CHECK(times == std::vector<double>{30 * minute, 40 * minute, hour, 8 * hour});
}

TEST_CASE("a test too short for any stopping time has one row", "[reading]") {
  CHECK(ladder_times(50, 50, 50, 5) == std::vector<double>{50});
}
