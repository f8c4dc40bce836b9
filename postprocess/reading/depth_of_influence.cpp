#include "postprocess/reading/depth_of_influence.hpp"

#include <algorithm>
#include <cmath>
#include <limits>

#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::postprocess {
namespace {

constexpr double kMoves = 0.05;       // what counts as an influence
constexpr double kAccuracy = 0.05;    // of the runs: only their difference counts
constexpr double kTolerance = 0.02;   // of the depth
constexpr double kShallowest = 0.05;  // of the radius
constexpr double kDeepest = 4.0;      // of the depth wetted
constexpr double kFirstTime = 0.05;   // of the stop: what the mesh must resolve
constexpr double kSameDepth = 1e-6;   // [m]

// The ground with Ks times a factor below a depth, where a line is drawn whatever the factor.
solver::TestSetup with_factor_below(const solver::TestSetup& setup, double depth, double factor) {
  solver::TestSetup changed = setup;
  auto& layers = changed.layers_below;
  models::Layer split{depth, setup.soil, setup.initial_head, {}};
  bool has_line = false;
  for (const models::Layer& layer : setup.layers_below) {
    if (std::abs(layer.top - depth) < kSameDepth) has_line = true;
    if (layer.top < depth) split.soil = layer.soil, split.initial_head = layer.initial_head;
  }
  const auto below = [&](const models::Layer& l) { return l.top > depth - kSameDepth; };
  const auto at = std::find_if(layers.begin(), layers.end(), below);
  if (!has_line) layers.insert(at, split);
  for (models::Layer& layer : layers)
    if (below(layer)) layer.soil.Ks *= factor;
  return changed;
}

double flow_at_end(const solver::TestSetup& setup, const solver::Resolution& resolution,
                   const std::shared_ptr<const solver::CurveTable>& table,
                   const std::function<bool()>& keep_going) {
  const solver::TestRun run = solver::run_test(setup, resolution, table,
                                               [&](double) { return !keep_going || keep_going(); });
  if (run.interrupted || run.samples.empty()) return std::numeric_limits<double>::quiet_NaN();
  return run.samples.back().ring_flow;
}

}  // namespace

double influence_of(const solver::TestSetup& setup, double depth,
                    const solver::Resolution& resolution,
                    std::shared_ptr<const solver::CurveTable> table,
                    const std::function<bool()>& keep_going) {
  const auto flow = [&](double factor) {
    solver::TestSetup one = with_factor_below(setup, depth, factor);
    one.times = {one.duration};
    one.snapshots.clear();
    return flow_at_end(one, resolution, table, keep_going);
  };
  const double as_is = flow(1.0);
  if (!(as_is > 0.0)) return std::numeric_limits<double>::quiet_NaN();
  return std::abs(flow(2.0) / as_is - 1.0);
}

DepthOfInfluence depth_of_influence(const solver::TestSetup& setup, double stop, double wetted,
                                    std::shared_ptr<const solver::CurveTable> table,
                                    const std::function<bool()>& keep_going) {
  solver::TestSetup until_stop = setup;
  until_stop.duration = stop;
  const solver::Resolution resolution =
      solver::resolution_for(until_stop, kAccuracy, table->capillary_length(), kFirstTime * stop);
  const auto influence = [&](double depth) {
    return influence_of(until_stop, depth, resolution, table, keep_going);
  };
  double above = kShallowest * setup.ring.radius, below = std::max(wetted, 2 * above);
  const double shallowest = influence(above);
  if (std::isnan(shallowest)) return {};
  if (shallowest < kMoves) return {0.0, true};
  const double deepest = kDeepest * below;
  for (double at = influence(below); !(at < kMoves); at = influence(below)) {
    if (std::isnan(at) || below >= deepest) return {};
    above = below, below = 2.0 * below;
  }
  while (below > above * (1 + kTolerance)) {
    const double middle = std::sqrt(above * below), at = influence(middle);
    if (std::isnan(at)) return {};
    (at < kMoves ? below : above) = middle;
  }
  return {below, true};
}

}  // namespace ringwright::postprocess
