#include "models/soil/alpha_star_class.hpp"

#include <catch2/catch.hpp>
#include <stdexcept>
#include <string>

using namespace ringwright::models;

TEST_CASE("alpha* classes: 0.01, 0.04, 0.12 and 0.36 per cm", "[soil]") {
  // Elrick, Reynolds & Tan 1989, Ground Water Monit. Rev. 9:184 (from memory).
  const auto classes = alpha_star_classes();
  REQUIRE(classes.size() == 4);
  const double per_cm[] = {0.01, 0.04, 0.12, 0.36};
  for (std::size_t i = 0; i < 4; ++i) {
    CHECK(classes[i].alpha_star == Approx(100 * per_cm[i]));
    CHECK(classes[i].sentence.starts_with("capillary length "));
    // the length in the sentence is 1/alpha*, to the digits it has
    const double cm = std::stod(std::string(classes[i].sentence.substr(17)));
    CHECK(cm == Approx(1 / per_cm[i]).epsilon(0.01));
  }
  CHECK(usual_alpha_star_class().alpha_star == 12.0);
}

TEST_CASE("alpha* classes: the nearest one by ratio", "[soil]") {
  CHECK(nearest_alpha_star_class(1e-3).word == "compacted");
  CHECK(nearest_alpha_star_class(2.1).word == "fine");  // the middle of 1 and 4 is 2
  CHECK(nearest_alpha_star_class(6.8).word == "fine");  // of 4 and 12 is 6.93
  CHECK(nearest_alpha_star_class(7.0).word == "structured");
  CHECK(nearest_alpha_star_class(100.0).word == "coarse");
  CHECK_THROWS_AS(nearest_alpha_star_class(0.0), std::invalid_argument);
}
