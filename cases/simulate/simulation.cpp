#include "cases/simulate/simulation.hpp"

#include <algorithm>

#include "cases/simulate/question.hpp"

namespace ringwright::cases {

bool Simulation::complete() const {
  return tests.size() == what.tests.size() &&
         std::all_of(tests.begin(), tests.end(), [&](const AnsweredTest& answered) {
           return answered.answers.size() == what.ground.variants.size() &&
                  !answered.answers.back().interrupted;
         });
}

bool Simulation::accuracy_met() const {
  for (const AnsweredTest& answered : tests) {
    for (const postprocess::Answer& answer : answered.answers) {
      if (!answer.accuracy_met) return false;
    }
  }
  return true;
}

const postprocess::LadderRow* stop_of(const postprocess::Answer& answer) {
  const auto row = std::find_if(answer.ladder.begin(), answer.ladder.end(),
                                [](const auto& candidate) { return candidate.stops_here; });
  return row == answer.ladder.end() ? nullptr : &*row;
}

void answer_tests(Simulation& simulation, int threads,
                  const postprocess::ProgressObserver& observer) {
  const Case& what = simulation.what;
  const double total = static_cast<double>(what.tests.size() * what.ground.variants.size());
  double finished = 0.0;
  const postprocess::ProgressObserver part = [&](double fraction) {
    return !observer || observer((finished + fraction) / total);
  };
  for (const Test& test : what.tests) {
    for (std::size_t i = 0; i < what.ground.variants.size(); ++i) {
      const auto question =
          question_of(test, what.ground, what.ground.variants[i], what.accuracy, threads);
      auto answer = postprocess::answer(question, part);
      if (i == 0) simulation.tests.push_back({test, {}});
      simulation.tests.back().answers.push_back(std::move(answer));
      if (simulation.tests.back().answers.back().interrupted) return;
      finished += 1.0;
    }
  }
}

}  // namespace ringwright::cases
