#include "models/soil/moisture.hpp"

#include <catch2/catch.hpp>
#include <memory>

#include "models/soil/catalogue.hpp"
#include "models/soil/van_genuchten.hpp"

using namespace ringwright::models;

namespace {

// Celia, Bouloutas & Zarba 1990, Water Resour. Res. 26:1483.
Soil known_soil() {
  return {std::make_shared<VanGenuchten>(3.35, 2.0), 0.102, 0.368, 9.22e-5, 0.0};
}

}  // namespace

TEST_CASE("moisture: a suction gives content and saturation", "[soil]") {
  // theta(-75 cm) = 0.200366: computed for this project by an independent prototype.
  const MoistureState state = moisture_at_suction(known_soil(), 0.75);
  CHECK(state.head == -0.75);
  CHECK(state.suction == 0.75);
  CHECK(state.water_content == Approx(0.200366).margin(5e-7));
  CHECK(state.degree_of_saturation == Approx(0.200366 / 0.368).margin(2e-6));
  CHECK(state.effective_saturation == Approx((0.200366 - 0.102) / 0.266).margin(2e-6));
}

TEST_CASE("moisture: every way back gives the same state", "[soil]") {
  for (const PublishedSoil& row : published_soils()) {
    INFO(row.texture << ", " << row.source);
    const Soil soil = make_soil(row);
    for (const MoistureWord& word : moisture_words()) {
      const MoistureState given = moisture_at_suction(soil, word.suction);
      const MoistureState by_content = moisture_at_content(soil, given.water_content);
      const MoistureState by_degree = moisture_at_saturation(soil, given.degree_of_saturation);
      CHECK(by_content.suction == Approx(word.suction).epsilon(1e-9));
      CHECK(by_degree.suction == Approx(word.suction).epsilon(1e-9));
      CHECK(by_content.degree_of_saturation == Approx(given.degree_of_saturation).epsilon(1e-13));
    }
  }
}

TEST_CASE("moisture: words", "[soil]") {
  // dry, moist, wet = 3000, 300, 60 cm: common practice, no source.
  CHECK(suction_of_word("dry") == 30.0);
  CHECK(suction_of_word("moist") == 3.0);
  CHECK(suction_of_word("wet") == 0.6);
  CHECK_FALSE(suction_of_word("damp"));
}

TEST_CASE("moisture: saturated, and out of range", "[soil]") {
  const Soil soil = known_soil();
  CHECK(moisture_at_saturation(soil, 1.0).suction == 0.0);
  CHECK(moisture_at_content(soil, 0.368).head == 0.0);
  CHECK(moisture_at_suction(soil, 0.0).degree_of_saturation == 1.0);
  CHECK_THROWS_AS(moisture_at_content(soil, 0.102), std::invalid_argument);
  CHECK_THROWS_AS(moisture_at_content(soil, 0.369), std::invalid_argument);
  CHECK_THROWS_AS(moisture_at_saturation(soil, 1.01), std::invalid_argument);
  CHECK_THROWS_AS(moisture_at_suction(soil, -0.1), std::invalid_argument);
}
