#include "solver/resolution.hpp"

#include <algorithm>
#include <cmath>

#include "models/soil/capillary_length.hpp"
#include "solver/domain.hpp"
#include "solver/mesh/ring_soils.hpp"
#include "solver/mesh/ring_walls.hpp"

namespace ringwright::solver {
namespace {

// How far below the deepest foot a layer still shapes the flow at it, in radii.
constexpr double kNear = 4.0;

// Cells are made smaller for what lies this close to a foot or is this thin, but not without end.
constexpr double kSmallestShare = 1.0 / 8.0;

double deepest_foot(const TestSetup& setup) {
  double d = 0.0;
  for (const models::SingleRing& ring : rings_of(setup)) d = std::max(d, ring.insertion);
  return d;
}

bool is_near(const TestSetup& setup, const models::Layer& layer) {
  const double a = rings_of(setup).back().radius;
  return layer.top < deepest_foot(setup) + kNear * a;
}

double shortest_capillary_length(const TestSetup& setup, double uppermost) {
  double shortest = uppermost;
  for (const models::Layer& layer : setup.layers_below)
    if (is_near(setup, layer))
      shortest = std::min(shortest, models::capillary_length(*layer.soil.curves));
  return shortest;
}

// What the least fillable of the soils can still take, where it can take anything.
double fillable(const TestSetup& setup) {
  const auto table = setup.water_table;
  const auto left = [](const models::Soil& soil, double head) {
    return soil.theta_s - soil.water_content(head);
  };
  double least = left(setup.soil, table ? -*table : setup.initial_head);
  for (const models::Layer& layer : setup.layers_below) {
    if (!is_near(setup, layer) || (table && layer.top >= *table)) continue;
    const double in_layer = left(layer.soil, table ? layer.top - *table : layer.initial_head);
    if (in_layer > 0.0) least = std::min(least, in_layer);
  }
  return least;
}

// Height of the cells at the foot of one ring that its own size asks for. Between two ponds less
// flows at the foot of the inner ring, and its error counts for more.
double tip_of(const TestSetup& setup, const models::SingleRing& ring, double accuracy,
              double lambda, bool between_ponds) {
  const double a = ring.radius / stretch_at_foot(setup, ring), d = ring.insertion;
  const double share = between_ponds ? 3.0 : 4.0;
  double tip = std::sqrt(share * accuracy * a * (d > 0.0 ? std::min(d, lambda) : lambda));
  tip = std::min({tip, a / 4, lambda / 2});
  return std::min(tip, d > 0.0 ? d / 2 : ring.wall / 2 / stretch_at_foot(setup, ring));
}

// A line at a distance from a foot needs cells no larger than half of it.
double refined(double tip, double distance) {
  if (distance <= kSameDepth) return tip;
  return std::min(tip, std::max(distance / 2, kSmallestShare * tip));
}

double tip_cell(const TestSetup& setup, double accuracy, double lambda) {
  std::vector<models::SingleRing> rings = rings_of(setup);
  if (inner_ring_divides_nothing(setup)) rings.erase(rings.begin());
  double tip = INFINITY;
  for (const models::SingleRing& ring : rings)
    tip = std::min(tip, tip_of(setup, ring, accuracy, lambda, &ring != &rings.back()));
  if (rings.size() == 2)
    tip = std::min(tip, (rings[1].radius - rings[0].radius) / 4 / stretch_at_foot(setup, rings[0]));
  const double unrefined = tip;
  const auto refine = [&](double distance) { tip = std::min(tip, refined(unrefined, distance)); };
  for (const models::SingleRing& ring : rings) {
    for (const models::SingleRing& other : rings)
      if (ring.insertion > 0.0 && other.insertion > 0.0)
        refine(std::abs(ring.insertion - other.insertion));
    for (const models::Layer& layer : setup.layers_below)
      refine(std::abs(layer.top - ring.insertion));
    if (ring.insertion <= 0.0) continue;
    if (setup.disturbed) refine(setup.disturbed->width / stretch_at_foot(setup, ring));
  }
  return tip;
}

}  // namespace

Resolution resolution_for(const TestSetup& setup, double accuracy, double capillary_length,
                          double first_time) {
  Resolution r;
  r.splits = 0;
  r.tip_cell = tip_cell(setup, accuracy, shortest_capillary_length(setup, capillary_length));
  const double wetted = wetted_depth_estimate(setup, capillary_length, first_time);
  r.top_cell = std::min(0.035 * std::sqrt(accuracy / 0.01) * wetted, 2 * r.tip_cell);
  const double finer = std::pow(accuracy / 0.01, 0.35);
  r.growth = std::pow(1.82, finer);
  r.growth_down = std::pow(1.47, finer);
  r.growth_inside = std::pow(1.26, finer);
  r.theta_tolerance = std::min(0.01, 0.03 * fillable(setup)) * std::min(1.0, accuracy / 0.01);
  return r;
}

}  // namespace ringwright::solver
