#pragma once
/// What is done and read when: the stages of a test on the clock, and its readings.
///
/// Readings restart where a stage begins, so that none straddles a change of head. What is left of
/// a stage at its end is a reading of its own; in a test of several stages what is shorter than
/// half an interval is read together with the interval before it. A soak is not read.

#include <optional>
#include <vector>

#include "postprocess/reading/answer.hpp"
#include "solver/steady_ring.hpp"

namespace ringwright::postprocess {

struct PlannedStage {
  std::size_t index = 0;  ///< into the program
  models::Stage stage;
  double from = 0.0, to = 0.0;  ///< [s]
  /// Heads held in all rings at its end; none where one of them falls.
  std::optional<solver::SteadyHeads> held;

  bool is_constant() const { return stage.kind == models::StageKind::constant_head; }
};

struct PlannedReading {
  double from = 0.0, to = 0.0;  ///< [s]
  std::size_t stage = 0;        ///< index into TestPlan::stages
};

struct TestPlan {
  std::vector<PlannedStage> stages;  ///< one for a test without a program
  std::vector<PlannedReading> readings;
  bool is_constant = true;  ///< every ring at one constant head from start to end
  bool has_program = false;

  std::vector<double> stage_starts() const;  ///< [s]
  /// The different sets of heads that are held and read; the one held last stands last.
  std::vector<solver::SteadyHeads> held_heads() const;
};

TestPlan plan_of(const Question& question);

/// Everything that any figure may ask for [s], ascending.
std::vector<double> wanted_times(const Question& question, const TestPlan& plan);

/// Sorts the times in and leaves out those that are there already.
void add_times(std::vector<double>& times, const std::vector<double>& more);

/// The program of a ring as stages on the clock, up to the end of the test.
/// @param pond_head held where the program has no stages [m]
std::vector<PlannedStage> stages_of(const models::PondProgram& program, double pond_head,
                                    double duration);

}  // namespace ringwright::postprocess
