#include "postprocess/reading/flags/flags.hpp"

#include <algorithm>

namespace ringwright::postprocess {

double highest_head(const TestAsRead& test, bool outer) {
  const solver::TestSetup& setup = test.question.setup;
  double highest = 0.0;
  for (const PlannedStage& s :
       stages_of(outer ? setup.outer_program : setup.program, setup.pond_head, setup.duration))
    if (s.from < test.stop) highest = std::max(highest, s.stage.head);
  return highest;
}

std::vector<Flag> raise_flags(const TestAsRead& test) {
  std::vector<Flag> flags;
  supply_flags(test, flags);
  reading_flags(test, flags);
  ground_flags(test, flags);
  lid_flags(test, flags);
  std::stable_sort(flags.begin(), flags.end(),
                   [](const Flag& a, const Flag& b) { return a.kind < b.kind; });
  return flags;
}

}  // namespace ringwright::postprocess
