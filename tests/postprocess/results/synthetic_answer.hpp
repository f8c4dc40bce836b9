#pragma once
/// An answer made up for the tests of the result files: six cells, three snapshots, two readings.
/// The numbers mean nothing; most have no short decimal form, so that a lost digit shows.

#include <cmath>
#include <memory>
#include <string>

#include "postprocess/reading/answer.hpp"
#include "postprocess/results/provenance.hpp"

namespace ringwright::tests {

/// Curves that nobody evaluates.
class NamedCurves : public models::Curves {
 public:
  double saturation(double) const override { return 1.0; }
  double saturation_slope(double) const override { return 0.0; }
  double relative_conductivity(double) const override { return 1.0; }
  double relative_conductivity_slope(double) const override { return 0.0; }
  double entry_head() const override { return 0.0; }
  double steepest_head() const override { return 0.0; }
  double head_at(double) const override { return 0.0; }
  double relative_flux_potential(double h) const override { return h; }
  std::string describe() const override { return "named for a test"; }
};

/// Three columns and two rows of quads below the surface, 0.1 m wide and 0.05 m high.
inline solver::Drawing six_quads() {
  solver::Drawing drawing;
  for (int row = 0; row <= 2; ++row) {
    for (int column = 0; column <= 3; ++column) {
      drawing.points.push_back({0.1 * column, -0.05 * row});
    }
  }
  for (int row = 0; row < 2; ++row) {
    for (int column = 0; column < 3; ++column) {
      const int upper = 4 * row + column;
      drawing.cells.push_back({upper + 4, upper + 5, upper + 1, upper});
      drawing.centres.push_back({0.1 * column + 0.05, -0.05 * row - 0.025});
    }
  }
  return drawing;
}

inline solver::TestRun three_snapshots() {
  solver::TestRun run;
  run.drawing = six_quads();
  for (int time = 1; time <= 3; ++time) {
    solver::Snapshot snapshot;
    snapshot.time = 600.0 * time;
    for (int cell = 0; cell < 6; ++cell) {
      snapshot.head.push_back(-std::sqrt(2.0 + cell) / time);
      snapshot.water_content.push_back(0.1 + 0.01 * cell + std::sqrt(0.001 * time));
    }
    run.snapshots.push_back(snapshot);
    run.samples.push_back({snapshot.time,
                           1e-3 * std::sqrt(time),
                           1e-7 / time,
                           1e-9 * time,
                           1e-11 * time,
                           1e-3 * std::sqrt(time) - 1e-9 * time,
                           {0.3, 0.07}});
  }
  run.statistics.cells = 6;
  run.statistics.steps = 321;
  run.statistics.newton_iterations = 987;
  run.statistics.balance_error = 2e-8;
  run.statistics.domain_radius = 0.3;
  run.statistics.domain_depth = 0.1;
  return run;
}

inline postprocess::Figure figure(double value) { return {value, std::abs(value) / 700.0}; }

inline postprocess::ReadsX reads(double factor) {
  return {figure(2.4 * factor), figure(1.4 * factor), figure(1.1 * factor)};
}

inline postprocess::LadderRow rung(double time, double factor, bool stops) {
  return {time,
          figure(9e-6 * factor),
          figure(5e-3 / factor),
          figure(9e-3 / factor),
          reads(factor),
          figure(factor / 3.0),
          stops};
}

inline postprocess::Question question() {
  postprocess::Question asked;
  asked.setup.soil = {std::make_shared<NamedCurves>(), 0.067, 0.45, 1.0 / 255000.0, 1e-5};
  asked.setup.initial_head = -3.0;
  asked.setup.ring = {0.15, 0.1};
  asked.setup.pond_head = 0.05;
  asked.setup.duration = 28800.0;
  asked.reading_interval = 600.0;
  asked.stop_readings = 3;
  asked.stop_within = 0.05;
  asked.assumed_alpha_star = 12.0;
  asked.viscosity_ratio = 1.3;
  return asked;
}

inline postprocess::Answer synthetic_answer() {
  postprocess::Answer answer;
  answer.question = question();
  answer.record.ring_area = 0.15 * 0.15 * std::acos(-1.0);
  answer.record.readings = {{600.0, 600.0, 1e-3 / 3.0, 1e-3 / 3.0, 0.05},
                            {1200.0, 600.0, 1e-3 / 7.0, 1e-3 / 3.0 + 1e-3 / 7.0, 0.05}};
  answer.ladder = {rung(600.0, 1.7, false), rung(1200.0, 1.3, true), rung(1800.0, 1.1, false)};
  answer.steady_rate = figure(8e-6);
  answer.steady_reads = reads(1.0);
  answer.time_to_steady = {7654.321, true};
  answer.peak_flow = 1e-5 / 3.0;
  answer.filling_volume = answer.record.ring_area * 0.05;
  answer.wetted_depth = figure(0.3);
  answer.wetted_beyond_wall = figure(0.07);
  answer.initial_water_content = 0.24;
  answer.initial_saturation = 0.45;
  answer.own_capillary_length = 0.1 / 3.0;
  answer.worst_relative_error = 1.0 / 700.0;
  answer.accuracy_met = true;
  answer.refinements = 1;
  answer.run = three_snapshots();
  answer.balance_error = 2e-8;
  answer.total_steps = 4321;
  answer.resolution.emplace();
  answer.resolution->tip_cell = 0.01;
  answer.resolution->top_cell = 0.002;
  answer.resolution->theta_tolerance = 1e-3;
  return answer;
}

/// The same, as if it had stages, an outer ring, rules, flags and events.
inline postprocess::Answer eventful_answer() {
  postprocess::Answer answer = synthetic_answer();
  answer.as_read = answer.record;
  for (auto& reading : answer.as_read.readings) reading.volume *= 1.1;
  answer.stages = {
      {0, 0.0, 600.0, 0.05, 0.05, figure(9e-6), 8.9e-6, figure(1e-3), figure(8e-6)},
      {1, 600.0, 1200.0, 0.15, 0.15, figure(2e-5), 2.2e-5, figure(2e-3), figure(1.7e-5), true}};
  answer.pairs = {{0, 1, figure(5e-6), figure(1.0 / 3.0), 4e-6, true, false}};
  answer.verdicts.resize(2);
  answer.verdicts[0].stop = 1200.0;
  answer.verdicts[0].rate = figure(9e-6);
  answer.verdicts[0].above_steady = figure(0.125);
  answer.verdicts[0].supply_volume = figure(0.0098);
  answer.verdicts[1].rule.kind = models::StopKind::after_volume;
  answer.verdicts[1].rule.name = "six hours";
  answer.flags = {{postprocess::FlagKind::surfacing, 0.002, 2700.0, 0.25, false},
                  {postprocess::FlagKind::piping, 2.5, 0.9, 0.0, true}};
  answer.run.events = {{300.0, solver::EventKind::reservoir_empty, true, 0.02},
                       {400.0, solver::EventKind::refilled, false, 0.1}};
  answer.run.surfacing = {true, 2700.0, 0.25, 0.003};
  answer.water = {figure(0.003), figure(0.0098), 0.0065, 0.0002, 0.0001, 1e-5};
  answer.outer_water = {figure(0.03), figure(0.098), 0.065, 0.002, 0.001, 1e-4};
  answer.outer = postprocess::OuterReading{figure(1e-5), figure(0.9e-5)};
  answer.influence = {0.21, true};
  answer.ended_early = true;
  return answer;
}

inline postprocess::Origin synthetic_origin() {
  return {"0.1.0",
          "ringwright: 1\njob: Quernmoor Hollow, 5 °C  # invented\n",
          {{"ring", {{"radius", 0.15}}}, {"head", 1.0 / 3.0}},
          {{"SUNDIALS", "6.4.1"}},
          {}};
}

inline postprocess::Provenance synthetic_provenance() {
  return postprocess::provenance_of(synthetic_origin(), synthetic_answer());
}

}  // namespace ringwright::tests
