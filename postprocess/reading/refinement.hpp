#pragma once
/// From the errors of one set of runs to the mesh and tolerance of the next.

#include "postprocess/reading/answer.hpp"
#include "postprocess/reading/test_plan.hpp"
#include "postprocess/reading/worst_figure.hpp"

namespace ringwright::postprocess {

/// A test with one head and one ring begins with what its accuracy asks for. In the Kfs of a pair
/// and the inner flow of a double ring, which are differences, errors count several times: those of
/// the cells at the foot of the wall most, those of time steps next. Such tests begin finer there.
class Refinement {
 public:
  Refinement(const TestPlan& plan, const Question& question);

  /// @param resolution of resolution_for()
  solver::Resolution begin(const solver::Resolution& resolution) const;
  /// After runs whose worst figures are not accurate enough.
  solver::Resolution next(const solver::Resolution& resolution, const WorstFigure& worst) const;

 private:
  double accuracy_;
  bool simple_;
};

}  // namespace ringwright::postprocess
