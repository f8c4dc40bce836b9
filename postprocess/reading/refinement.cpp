#include "postprocess/reading/refinement.hpp"

#include <algorithm>
#include <cmath>

namespace ringwright::postprocess {
namespace {

constexpr double kMeshShare = 0.6;  // of the accuracy, aimed at for the mesh
constexpr double kLargestShare = 0.9;

struct Manner {
  double begin_tolerance;  // share of what the accuracy would ask for
  double least_cells;      // share of the cell size kept in one round
  double time_share;       // of the accuracy, above which the tolerance falls
  double tolerance;        // to this share of itself
};
constexpr Manner kSimple{0.5, 0.4, 0.3, 0.3};
// Found on six soils, dry and wet: least time until every pair's Kfs, or both rings, are accurate;
// with a looser tolerance at the beginning, pairs in clay had larger errors than they told.
constexpr Manner kMore{0.1, 0.55, 0.5, 0.4};
constexpr double kBeginTip = 0.4;  // share of the cells at the foot of the wall

const Manner& manner(bool simple) { return simple ? kSimple : kMore; }

}  // namespace

Refinement::Refinement(const TestPlan& plan, const Question& question)
    : accuracy_(question.accuracy),
      simple_(plan.stages.size() == 1 && !question.setup.outer_ring) {}

solver::Resolution Refinement::begin(const solver::Resolution& resolution) const {
  solver::Resolution r = resolution;
  r.theta_tolerance *= manner(simple_).begin_tolerance;
  if (simple_) return r;
  r.tip_cell *= kBeginTip;
  r.top_cell = std::min(resolution.top_cell, 2 * r.tip_cell);
  return r;
}

// Errors of the mesh fall about with the square of the cell size, those of time with the tolerance.
solver::Resolution Refinement::next(const solver::Resolution& resolution,
                                    const WorstFigure& worst) const {
  solver::Resolution r = resolution;
  const Manner& m = manner(simple_);
  if (worst.time_part > m.time_share * accuracy_) r.theta_tolerance *= m.tolerance;
  if (worst.mesh_part > kMeshShare * accuracy_)
    r = r.scaled(std::clamp(std::sqrt(kMeshShare * accuracy_ / worst.mesh_part), m.least_cells,
                            kLargestShare));
  return r;
}

}  // namespace ringwright::postprocess
