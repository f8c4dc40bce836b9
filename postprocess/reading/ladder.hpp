#pragma once
/// The stop ladder: what the form would say at each stopping time.

#include <vector>

#include "postprocess/reading/answer.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/worst_figure.hpp"

namespace ringwright::postprocess {

struct Ladder {
  std::vector<LadderRow> rows;
  Figure steady_rate;  ///< [m/s]
  ReadsX steady_reads;
  WorstFigure worst;
};

/// @param question with one constant head from start to end; `runs` hold its steady flow
/// @param stop time at which the test ends [s], one of the sampled times
Ladder make_ladder(const Question& question, const CompanionRuns& runs, double stop);

}  // namespace ringwright::postprocess
