#include "solver/domain.hpp"

#include <algorithm>
#include <cmath>

#include "models/soil/capillary_length.hpp"
#include "solver/mesh/ring_soils.hpp"
#include "solver/mesh/ring_walls.hpp"

namespace ringwright::solver {
namespace {

// Far cells are large, so that a generous domain costs less than a second run.
constexpr double kReach = 4.0;
// Below layers and near a water table the ground may be saturated: as if this were left [-].
constexpr double kLeastFillable = 0.01;

// What keeps the head given far outside, and the bottom, from being felt to 0.1 % above a water
// table two radii below the foot, measured for capillary lengths of 7 to 50 cm.
constexpr double kBesideTable = 1.5;

struct Spread {
  double capillary, gravity;  // [m]
};

double fillable(const models::Soil& soil, double initial_head) {
  return soil.theta_s - soil.water_content(initial_head);
}

Spread spread(const models::Soil& soil, double dtheta, double lambda, double head, double t) {
  const double S2 = 2.0 * soil.Ks * dtheta * (head + lambda);
  return {std::sqrt(S2 * t) / dtheta, soil.Ks * t / dtheta};
}

std::vector<double> heads(const TestSetup& setup) {
  std::vector<double> all;
  const auto add = [&](const models::PondProgram& program) {
    if (program.stages.empty()) all.push_back(setup.pond_head);
    for (const models::Stage& stage : program.stages) all.push_back(stage.head);
  };
  add(setup.program);
  if (setup.outer_ring) add(setup.outer_program);
  return all;
}

// What a layer can still take, at its top where it is driest.
double fillable_of(const TestSetup& setup, std::size_t layer) {
  const models::Soil& soil = layer_soil(setup, static_cast<int>(layer));
  const double top = layer == 0 ? 0.0 : setup.layers_below[layer - 1].top;
  if (const auto table = setup.water_table)
    return std::max(fillable(soil, top - *table), kLeastFillable);
  if (layer == 0) return fillable(soil, setup.initial_head);
  return std::max(fillable(soil, setup.layers_below[layer - 1].initial_head), kLeastFillable);
}

// Of the soil of a layer; that of the uppermost one is known.
double capillary_length_of(const TestSetup& setup, std::size_t layer, double uppermost) {
  return layer == 0 ? uppermost
                    : models::capillary_length(*setup.layers_below[layer - 1].soil.curves);
}

double radius_of(const TestSetup& setup) {
  return setup.outer_ring ? setup.outer_ring->radius : setup.ring.radius;
}

double deepest_foot(const TestSetup& setup) {
  return setup.outer_ring ? std::max(setup.ring.insertion, setup.outer_ring->insertion)
                          : setup.ring.insertion;
}

}  // namespace

double largest_head(const TestSetup& setup) {
  const std::vector<double> all = heads(setup);
  return *std::max_element(all.begin(), all.end());
}

double wetted_depth_estimate(const TestSetup& setup, double lambda, double t) {
  const auto& stages = setup.program.stages;
  const double head = stages.empty() ? setup.pond_head : stages.front().head;
  const Spread s = spread(setup.soil, fillable_of(setup, 0), lambda, head, t);
  return s.capillary + s.gravity;
}

Domain transient_domain(const TestSetup& setup, double lambda) {
  const double a = radius_of(setup), d = deepest_foot(setup), H = largest_head(setup);
  Domain domain;
  for (std::size_t k = 0; k <= setup.layers_below.size(); ++k) {
    if (k > 0 && setup.layers_below[k - 1].top >= domain.depth) break;
    const models::Soil& soil = layer_soil(setup, static_cast<int>(k));
    const double own = capillary_length_of(setup, k, lambda);
    const Spread s = spread(soil, fillable_of(setup, k), own, H, setup.duration);
    const double stretch = std::sqrt(soil.anisotropy);
    domain.radius =
        std::max(domain.radius, a + kReach * (s.capillary + own) * std::max(1.0, stretch));
    domain.depth = std::max(domain.depth, d + kReach * (s.capillary + s.gravity + own));
  }
  // saturated ground passes every change on at once
  if (setup.water_table) {
    const Domain steady = steady_domain(setup, lambda);
    return {std::max(domain.radius, steady.radius), steady.depth};
  }
  return domain;
}

Domain steady_domain(const models::SingleRing& ring, double lambda) {
  const double a = ring.radius;
  const double reach = 100.0 * a * std::pow(std::max(lambda / a, 0.2), 0.6);
  return {a + reach, ring.insertion + reach};
}

Domain steady_domain(const TestSetup& setup, double lambda) {
  models::SingleRing widest;
  widest.radius = radius_of(setup), widest.insertion = deepest_foot(setup);
  double longest = lambda, stretch = 1.0;
  for (std::size_t k = 0; k <= setup.layers_below.size(); ++k) {
    longest = std::max(longest, capillary_length_of(setup, k, lambda));
    stretch = std::max(stretch, std::sqrt(layer_soil(setup, static_cast<int>(k)).anisotropy));
  }
  Domain domain = steady_domain(widest, longest);
  if (stretch > 1.0) domain.radius = widest.radius + stretch * (domain.radius - widest.radius);
  if (!setup.water_table) return domain;
  return {kBesideTable * domain.radius, *setup.water_table + kBesideTable * domain.depth};
}

}  // namespace ringwright::solver
