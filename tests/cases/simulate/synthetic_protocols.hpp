#pragma once
/// Answers of staged, double and lidded tests with round, invented numbers.

#include "tests/cases/simulate/synthetic_answer.hpp"

namespace ringwright::test {

inline postprocess::StageReading stage_reading(double from_h, double to_h, double head_from,
                                               double head_to, double rate, double as_read,
                                               double steady, double soil) {
  postprocess::StageReading reading;
  reading.from = from_h * 3600.0;
  reading.to = to_h * 3600.0;
  reading.head_from = head_from;
  reading.head_to = head_to;
  reading.rate.value = rate * mm_per_h;
  reading.rate_as_read = as_read * mm_per_h;
  reading.steady_rate.value = steady * mm_per_h;
  reading.soil_volume.value = soil * litre;
  return reading;
}

inline postprocess::WaterUse water_use(double soil, double standing, double evaporated,
                                       double removed) {
  postprocess::WaterUse water;
  water.soil.value = soil * litre;
  water.standing = standing * litre;
  water.evaporated = evaporated * litre;
  water.removed = removed * litre;
  water.supply.value = (soil + standing + evaporated + removed) * litre;
  return water;
}

/// A soak, then 5 cm and 20 cm for an hour each.
inline postprocess::Answer two_head_answer() {
  postprocess::Answer answer = answer_frame(14.0);
  answer.question.stop_readings = 0;
  answer.stages = {stage_reading(0.0, 0.5, 0.05, 0.05, 0.0, 0.0, 0.0, 1.0),
                   stage_reading(0.5, 1.5, 0.05, 0.05, 40.0, 41.0, 32.0, 3.0),
                   stage_reading(1.5, 2.5, 0.20, 0.20, 70.0, 63.0, 56.0, 5.0)};
  answer.stages[0].soak = true;
  answer.pairs.push_back({1, 2, {21.0 * mm_per_h, 0.0}, {1.5, 0.0}, 28.0 * mm_per_h, true, true});
  answer.record.readings = {{5400.0, 600.0, 1e-3, 1e-3, 0.05}, {9000.0, 600.0, 1e-3, 2e-3, 0.20}};
  answer.water = water_use(9.0, 3.0, 0.0, 0.0);
  answer.water.peak_flow = 2.0 * litre / 60.0;
  answer.peak_flow = 0.9 * litre / 60.0;
  answer.wetted_depth = {0.30, 0.004};
  answer.wetted_beyond_wall = {0.072, 0.002};
  answer.influence = {0.21, true};
  return answer;
}

/// The test that goes with it.
inline cases::Simulation two_head_simulation() {
  cases::Simulation simulation = simulation_of(1);
  cases::Test& test = simulation.what.tests.front();
  test.name = "two heads";
  test.program.stages = {{.head = 0.05, .duration = 1800.0, .soak = true},
                         {.head = 0.05, .duration = 3600.0},
                         {.head = 0.20, .duration = 3600.0}};
  simulation.tests = {{test, {two_head_answer()}}};
  return simulation;
}

/// One fall from 10 cm to 4 cm in two hours, filled up once on the way.
inline cases::Simulation falling_simulation() {
  cases::Simulation simulation = simulation_of(1);
  cases::Test& test = simulation.what.tests.front();
  test.name = "fall";
  test.program.stages = {{.kind = models::StageKind::free_fall,
                          .head = 0.10,
                          .duration = 7200.0,
                          .refill_below = 0.03}};
  postprocess::Answer answer = answer_frame(14.0);
  answer.question.stop_readings = 0;
  answer.stages = {stage_reading(0.0, 2.0, 0.10, 0.04, 28.0, 28.0, 0.0, 7.0)};
  answer.record.readings = {{3600.0, 3600.0, 0.07 * 0.035, 0.07 * 0.035, 0.065},
                            {7200.0, 3600.0, 0.07 * 0.028, 0.07 * 0.063, 0.04}};
  answer.run.events = {{4000.0, solver::EventKind::refilled, false, 0.10},
                       {9000.0, solver::EventKind::emptied, false, 0.0}};
  answer.water = water_use(7.0, 2.8, 0.0, 0.0);
  simulation.tests = {{test, {answer}}};
  return simulation;
}

/// The constant head of simulation_of(1) with a 60 cm ring around it.
inline cases::Simulation double_ring_simulation() {
  cases::Simulation simulation = simulation_of(1);
  cases::Test& test = simulation.what.tests.front();
  test.name = "double";
  test.outer_ring = models::SingleRing{0.30, 0.15};
  postprocess::Answer answer = first_answer();
  answer.question.setup.outer_ring = test.outer_ring;
  answer.water = water_use(9.3, 3.5, 0.0, 0.0);
  answer.outer_water = water_use(40.0, 10.6, 0.4, 6.0);
  answer.outer = postprocess::OuterReading{{38.0 * mm_per_h, 0.0}, {33.0 * mm_per_h, 0.0}};
  simulation.tests = {{test, {answer}}};
  return simulation;
}

}  // namespace ringwright::test
