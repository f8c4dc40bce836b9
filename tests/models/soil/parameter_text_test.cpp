#include "models/soil/parameter_text.hpp"

#include <catch2/catch.hpp>
#include <string>

using ringwright::models::parameter_text;

TEST_CASE("parameter text: short, and read back as the same number", "[soil]") {
  CHECK(parameter_text(1.56) == "1.56");
  CHECK(parameter_text(-0.02) == "-0.02");
  CHECK(parameter_text(12.0) == "12");
  for (const double value : {0.1 + 0.2, 1e-300, 1.0 / 3.0, 123456789.125}) {
    CHECK(std::stod(parameter_text(value)) == value);
  }
}
