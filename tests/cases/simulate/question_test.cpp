#include "cases/simulate/question.hpp"

#include <catch2/catch.hpp>

#include "tests/cases/simulate/synthetic_answer.hpp"

namespace {

using namespace ringwright;

TEST_CASE("a question has conductivity at test temperature", "[question]") {
  auto what = test::simulation_of(1).what;
  what.ground.water_temperature = 0.0;
  const auto question =
      cases::question_of(what.tests[0], what.ground, what.ground.variants[0], 0.003, 2);
  // Viscosity at 0 over that at 20 degC: 1.789 (IAPWS release on liquid water, from memory).
  CHECK(question.viscosity_ratio == Approx(1.789).epsilon(1e-3));
  CHECK(question.setup.soil.Ks * question.viscosity_ratio ==
        Approx(18.2 * test::mm_per_h).epsilon(1e-12));
  CHECK(question.setup.initial_head == -3.0);
  CHECK(question.setup.ring.radius == 0.15);
  CHECK(question.setup.pond_head == 0.05);
  CHECK(question.setup.duration == 28800.0);
  CHECK(question.stop_readings == 3);
  CHECK(question.stop_within == 0.05);
  CHECK(question.assumed_alpha_star == 12.0);
  CHECK(question.accuracy == 0.003);
  CHECK(question.threads == 2);
}

TEST_CASE("readings that are not said are taken every twentieth of the test", "[question]") {
  auto what = test::simulation_of(1).what;
  cases::Test& test = what.tests[0];
  const auto interval = [&] {
    return cases::question_of(test, what.ground, what.ground.variants[0], 0.01, 1).reading_interval;
  };
  CHECK(interval() == Approx(0.05 * 28800.0));
  test.protocol.longest = 600.0;
  CHECK(interval() == 60.0);
  test.protocol.reading_interval = 42.0;
  CHECK(interval() == 42.0);
  test.protocol.stop.reset();
  CHECK(cases::question_of(test, what.ground, what.ground.variants[0], 0.01, 1).stop_readings == 0);
}

}  // namespace
