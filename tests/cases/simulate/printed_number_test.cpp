#include "cases/simulate/printed_number.hpp"

#include <catch2/catch.hpp>
#include <limits>

namespace {

using namespace ringwright::cases;

TEST_CASE("two figures, three after a leading 1", "[screen]") {
  CHECK(rounded(34.4) == "34");
  CHECK(rounded(1.319) == "1.32");
  CHECK(rounded(0.7116) == "0.71");
  CHECK(rounded(12.84) == "12.8");
  CHECK(rounded(342.0) == "340");
  CHECK(rounded(1234.0) == "1230");
  CHECK(rounded(99.4) == "99");
  CHECK(rounded(99.6) == "99.6");
  CHECK(rounded(0.996) == "0.996");
  CHECK(rounded(19.7) == "19.7");
  CHECK(rounded(1.999) == "2.0");
  CHECK(rounded(0.00123) == "0.00123");
  CHECK(rounded(-5.67) == "-5.7");
  CHECK(rounded(2.5e-7) == "2.5e-07");
  CHECK(rounded(0.0) == "0");
  CHECK(rounded(std::numeric_limits<double>::infinity()) == "-");
}

TEST_CASE("what one must bring is rounded up", "[screen]") {
  CHECK(rounded_up(12.1) == "13");
  CHECK(rounded_up(13.0) == "13");
  CHECK(rounded_up(6.12) == "6.2");
  CHECK(rounded_up(121.0) == "130");
  CHECK(rounded_up(0.0) == "0");
}

TEST_CASE("fractions as per cent", "[screen]") {
  CHECK(percent(0.617) == "62 %");
  CHECK(percent(0.0144) == "1.4 %");
  CHECK(percent(-0.0321) == "-3.2 %");
  CHECK(percent(-1e-9) == "0 %");
  CHECK(given_percent(0.01) == "1 %");
  CHECK(given_percent(0.003) == "0.3 %");
}

TEST_CASE("rates, volumes and flows in the units of the trade", "[screen]") {
  CHECK(mm_per_hour(1e-5) == "36");              // 1e-5 m/s = 36 mm/h
  CHECK(inch_per_hour(7.0555556e-6) == "1.00");  // 1 in/h = 0.0254 m / 3600 s
  CHECK(litres(0.0128) == "12.8");
  CHECK(centimetres(0.3048) == "30.48");  // 12 in
  CHECK(flow(1e-6) == "60 mL/min");
  CHECK(flow(5e-5) == "3.0 L/min");
}

TEST_CASE("times", "[screen]") {
  CHECK(time_text(45.0) == "45 s");
  CHECK(time_text(90.0) == "1.5 min");
  CHECK(time_text(1800.0) == "30 min");
  CHECK(time_text(3600.0) == "1 h");
  CHECK(time_text(9000.0) == "2 h 30 min");
  CHECK(time_text(3599.9) == "1 h");
  CHECK(time_text(172800.0) == "48 h");
  CHECK(about_time(27000.0) == "7.5 h");
  CHECK(about_time(3600000.0) == "42 days");
}

}  // namespace
