#pragma once
/// From a question to its answer: chooses mesh and tolerance, runs the test and its companions,
/// refines until every promised figure is as accurate as asked, and reads the result as a crew
/// would.
///
/// Promised to the accuracy asked for: volumes from 5 % of the time of the stop, rates (and the
/// Kfs made from them) from 25 %, the steady rate, the rate over the steady rate; of a test in
/// stages the rate at every stage's end and the Kfs of every pair (see head_pairs.hpp); of a double
/// ring both rings. The wetted depth and width carry their own, larger error.

#include <functional>
#include <memory>

#include "postprocess/reading/answer.hpp"

namespace ringwright::solver {
class CurveTable;
}

namespace ringwright::postprocess {

/// Called with the fraction of the work done, 0 to 1, never falling; returning false interrupts.
/// With several threads it is called from any of them, one at a time.
using ProgressObserver = std::function<bool(double fraction_done)>;

/// @param table look-up table of the soil's curves, if one was made before
/// @throws solver::SolverFailure when a run cannot go on
Answer answer(const Question& question, const ProgressObserver& observer = {},
              std::shared_ptr<const solver::CurveTable> table = nullptr);

}  // namespace ringwright::postprocess
