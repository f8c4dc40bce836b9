#pragma once
/// Collects the errors of the promised figures.

#include <cmath>

#include "postprocess/reading/companion_runs.hpp"

namespace ringwright::postprocess {

/// The least accurate of the promised figures.
struct WorstFigure {
  double relative_error = 0.0;  ///< [-]
  double mesh_part = 0.0;       ///< of the promised figures, the largest from the mesh [-]
  double time_part = 0.0;       ///< the largest from the time tolerance [-]
};

/// The larger of each.
WorstFigure worse_of(const WorstFigure& a, const WorstFigure& b);

/// Splits a figure's error again into mesh and time, for the choice of what to refine.
class WorstOf {
 public:
  explicit WorstOf(const CompanionRuns& runs) : runs_(runs) {}

  /// @param f the figure from any of the runs @param least what its error is held against at least
  template <class F>
  void promise(const Figure& figure, const F& f, double least = 0.0) {
    const double fine = f(runs_.fine), coarse = f(runs_.coarse), loose = f(runs_.loose);
    const double scale = std::max(std::abs(fine), least);
    if (!(scale > 0.0)) return;
    add(figure.error / scale, std::abs(fine - coarse) / scale, std::abs(coarse - loose) / scale);
  }
  /// A figure that knows no time.
  void promise(const Figure& figure, double mesh_part) {
    add(figure.relative_error(), mesh_part, 0.0);
  }
  const WorstFigure& worst() const { return worst_; }

 private:
  void add(double error, double mesh_part, double time_part) {
    worst_ = worse_of(worst_, {error, mesh_part, time_part});
  }

  const CompanionRuns& runs_;
  WorstFigure worst_;
};

}  // namespace ringwright::postprocess
