#pragma once
/// What `simulate` computes: every test of a case on every reading of its soil.

#include <vector>

#include "cases/input/case.hpp"
#include "postprocess/reading/answer_question.hpp"

namespace ringwright::cases {

/// A test with its answers, at least one; answers[i] is for Ground::variants[i]. An interrupt or a
/// failure may leave fewer.
struct AnsweredTest {
  Test test;
  std::vector<postprocess::Answer> answers;
};

struct Simulation {
  Case what;
  std::vector<AnsweredTest> tests;

  /// Nothing is missing: neither interrupted nor failed on the way.
  bool complete() const;
  /// Every answer met the accuracy asked for.
  bool accuracy_met() const;
};

/// The stop of an answer: its ladder row; null when the run was interrupted before.
const postprocess::LadderRow* stop_of(const postprocess::Answer& answer);

/// Answers all tests of `simulation.what`. The observer is told the fraction done of the whole and
/// may stop it. What is finished by then, or before an exception, is in `simulation`.
/// @param threads companion runs that may go side by side
/// @throws std::invalid_argument for a hopeless question
/// @throws solver::SolverFailure
void answer_tests(Simulation& simulation, int threads,
                  const postprocess::ProgressObserver& observer = {});

}  // namespace ringwright::cases
