#include "postprocess/reading/test_plan.hpp"

#include <algorithm>
#include <catch2/catch.hpp>

#include "tests/postprocess/reading/staged_question.hpp"

using namespace ringwright;
using namespace ringwright::postprocess;

TEST_CASE("readings restart with every stage", "[reading]") {
  Question q = two_head_question();
  q.setup.program.stages[0].duration = 700.0;  // two readings of 300 s and a stub of 100 s
  q.setup.duration = 3100.0;
  const TestPlan plan = plan_of(q);
  REQUIRE(plan.stages.size() == 3);
  CHECK_FALSE(plan.is_constant);
  // the stub is less than half an interval: read with the one before
  REQUIRE(plan.readings.size() == 2 + 4 + 4);
  CHECK(plan.readings[0].to == 300.0);
  CHECK(plan.readings[1].from == 300.0);
  CHECK(plan.readings[1].to == 700.0);
  CHECK(plan.readings[2].from == 700.0);
  CHECK(plan.readings[2].to == 1000.0);
  for (const PlannedReading& r : plan.readings) {
    const PlannedStage& s = plan.stages[r.stage];
    CHECK(r.from >= s.from);
    CHECK(r.to <= s.to);
  }
}

TEST_CASE("half an interval or more left of a stage is a reading", "[reading]") {
  Question q = two_head_question();
  q.setup.program.stages[0].duration = 750.0;
  q.setup.duration = 3150.0;
  const TestPlan plan = plan_of(q);
  CHECK(plan.readings[2].from == 600.0);
  CHECK(plan.readings[2].to == 750.0);
}

TEST_CASE("a soak is not read and the last stage holds to the end", "[reading]") {
  Question q = two_head_question();
  q.setup.program.stages[0].soak = true;
  q.setup.duration = 4800.0;
  const TestPlan plan = plan_of(q);
  CHECK(plan.readings.front().from == 1200.0);
  CHECK(plan.stages.back().to == 4800.0);
  CHECK(plan.stage_starts() == std::vector<double>{0.0, 1200.0, 2400.0});
  // both heads are read: 15 cm in the second stage, 5 cm in the third
  REQUIRE(plan.held_heads().size() == 2);
  CHECK(plan.held_heads().back().ring == 0.05);
}

TEST_CASE("stages after the end of the test are left out", "[reading]") {
  Question q = two_head_question();
  q.setup.duration = 1500.0;
  const TestPlan plan = plan_of(q);
  REQUIRE(plan.stages.size() == 2);
  CHECK(plan.stages[1].to == 1500.0);
}

TEST_CASE("heads are held in both rings or not at all", "[reading]") {
  Question q = double_ring_question();
  q.setup.outer_program.stages = {{.head = 0.08, .duration = 3600.0}};
  TestPlan plan = plan_of(q);
  REQUIRE(plan.held_heads().size() == 1);
  CHECK(plan.held_heads()[0].ring == 0.05);
  CHECK(plan.held_heads()[0].outer == 0.08);
  CHECK(plan.is_constant);
  q.setup.outer_program.stages[0].kind = models::StageKind::free_fall;
  plan = plan_of(q);
  CHECK(plan.held_heads().empty());
  CHECK_FALSE(plan.is_constant);
}

TEST_CASE("every reading and a minute after every filling are sampled", "[reading]") {
  const Question q = two_head_question();
  const TestPlan plan = plan_of(q);
  const std::vector<double> times = wanted_times(q, plan);
  CHECK(std::is_sorted(times.begin(), times.end()));
  for (double t : {60.0, 300.0, 1200.0, 1260.0, 2400.0, 2460.0, 3600.0})
    CHECK(std::count(times.begin(), times.end(), t) == 1);
}
