#include "postprocess/reading/test_record.hpp"

#include <catch2/catch.hpp>

#include "tests/postprocess/reading/staged_question.hpp"

using namespace ringwright;
using namespace ringwright::postprocess;

namespace {

// 1 mL/s into the ground, 0.1 mL/s into the air, sampled every 100 s.
solver::TestRun steady_run(double end) {
  solver::TestRun run;
  for (double t = 100.0; t <= end; t += 100.0) {
    solver::Sample s;
    s.time = t;
    s.ring_volume = s.water.soil = 1e-6 * t;
    s.water.evaporated = 1e-7 * t;
    s.water.head = 0.05;
    run.samples.push_back(s);
  }
  return run;
}

}  // namespace

TEST_CASE("the true record holds intake, the record as read evaporation too", "[reading]") {
  const Question q = two_head_question();
  const TestPlan plan = plan_of(q);
  const auto truth = true_record(q, plan, steady_run(3600.0));
  const auto read = record_as_read(q, plan, steady_run(3600.0));
  REQUIRE(truth.readings.size() == 12);
  for (std::size_t i = 0; i < 12; ++i) {
    CHECK(truth.readings[i].volume == Approx(3e-4));  // 300 s of 1 mL/s
    CHECK(read.readings[i].volume == Approx(3.3e-4));
    CHECK(read.readings[i].head == 0.05);
  }
  CHECK(truth.readings.back().total_volume == Approx(3.6e-3));
}

TEST_CASE("what the crew has went through the gauge", "[reading]") {
  Question q = two_head_question();
  q.gauge.volume_division = 2e-4;
  const auto read = record_as_read(q, plan_of(q), steady_run(3600.0));
  // totals 3.3, 6.6, 9.9 ... in units of 1e-4, to the nearest even number: 4, 6, 10
  CHECK(read.readings[0].volume == Approx(4e-4));
  CHECK(read.readings[1].volume == Approx(2e-4));
  CHECK(read.readings[2].volume == Approx(4e-4));
}

TEST_CASE("a soak is counted in totals but not read", "[reading]") {
  Question q = two_head_question();
  q.setup.program.stages[0].soak = true;
  const auto truth = true_record(q, plan_of(q), steady_run(3600.0));
  REQUIRE(truth.readings.size() == 8);
  CHECK(truth.readings[0].volume == Approx(3e-4));
  CHECK(truth.readings[0].total_volume == Approx(1.5e-3));
}

TEST_CASE("a run that ends early leaves whole readings", "[reading]") {
  const Question q = two_head_question();
  CHECK(true_record(q, plan_of(q), steady_run(800.0)).readings.size() == 2);
  CHECK(true_record(q, plan_of(q), {}).readings.empty());
}

TEST_CASE("the first rule governs; the older fields make one where there is none", "[reading]") {
  Question q = two_head_question();
  CHECK(rules_of(q).empty());
  q.stop_readings = 4, q.stop_within = 0.02;
  REQUIRE(rules_of(q).size() == 1);
  CHECK(rules_of(q)[0].readings == 4);
  CHECK(rules_of(q)[0].share == 0.02);
  q.rules = {{.kind = models::StopKind::after_time, .time = 900.0},
             {.kind = models::StopKind::after_volume, .volume = 1e-3}};
  const TestPlan plan = plan_of(q);
  const Stop stop = stop_of(q, plan, record_as_read(q, plan, steady_run(3600.0)));
  CHECK(stop.rule_met);
  CHECK(stop.reading == 2);
}
