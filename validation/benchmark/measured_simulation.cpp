#include "validation/benchmark/measured_simulation.hpp"

#include <algorithm>

#include "postprocess/reading/answer_question.hpp"
#include "solver/flow/curve_table.hpp"

namespace ringwright::validation {

solver::TestRun measured_cold(const solver::TestSetup& setup,
                              const solver::Resolution& resolution) {
  return solver::run_test(setup, resolution);
}

solver::TestRun measured_cached(const solver::TestSetup& setup,
                                const solver::Resolution& resolution, const Table& table) {
  return solver::run_test(setup, resolution, table);
}

solver::SteadyFlow measured_steady(const solver::TestSetup& setup,
                                   const solver::Resolution& resolution, const Table& table) {
  return solver::steady_flow({setup.soil, setup.ring, setup.pond_head}, resolution, table);
}

postprocess::Answer measured_answer(const solver::TestSetup& setup, double accuracy) {
  postprocess::Question q;
  q.setup = setup;
  q.reading_interval = std::max(60.0, 0.05 * setup.duration);  // the default of a case
  q.assumed_alpha_star = 12.0;                                 // the default of a case [1/m]
  q.accuracy = accuracy;
  return postprocess::answer(q);
}

}  // namespace ringwright::validation
