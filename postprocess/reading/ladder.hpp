#pragma once
/// The stop ladder: what the form would say at each stopping time.

#include <vector>

#include "postprocess/reading/answer.hpp"
#include "postprocess/reading/companion_runs.hpp"

namespace ringwright::postprocess {

/// The least accurate of the promised figures.
struct WorstFigure {
  double relative_error = 0.0;  ///< [-]
  double mesh_part = 0.0;       ///< of the promised figures, the largest from the mesh [-]
  double time_part = 0.0;       ///< the largest from the time tolerance [-]
};

struct Ladder {
  std::vector<LadderRow> rows;
  Figure steady_rate;  ///< [m/s]
  ReadsX steady_reads;
  WorstFigure worst;
};

/// @param stop time at which the test ends [s], one of the sampled times
Ladder make_ladder(const Question& question, const CompanionRuns& runs, double stop);

}  // namespace ringwright::postprocess
