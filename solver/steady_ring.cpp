#include "solver/steady_ring.hpp"

#include <algorithm>
#include <cmath>
#include <string>

#include "solver/failure.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/flow/flow_system.hpp"
#include "solver/flow/steady_newton.hpp"
#include "solver/ground_materials.hpp"
#include "solver/mesh/ring_mesh.hpp"
#include "solver/ring_patches.hpp"
#include "solver/settle.hpp"

namespace ringwright::solver {
namespace {

// Start: the steady point source in a Gardner soil (Philip 1968), capped near the rings; its head
// is taken in every material, and no drier than rest above a water table.
std::vector<double> first_potentials(const TestSetup& setup, const SteadyHeads& heads,
                                     const CellsAndFaces& mesh,
                                     const std::vector<Material>& materials) {
  const CurveTable& table = *materials.front().table;
  const double lambda = table.capillary_length();
  const double radius =
      setup.outer_ring && heads.outer ? setup.outer_ring->radius : setup.ring.radius;
  const double top =
      table.potential_of_head(std::max(heads.ring.value_or(0.0), heads.outer.value_or(0.0)));
  std::vector<double> Phi;
  for (std::size_t i = 0; i < mesh.volume.size(); ++i) {
    const auto& centre = mesh.drawing.centres[i];
    const double rho = std::hypot(centre[0], centre[1]);
    const double near = std::min(1.0, radius / std::max(rho, 1e-12));
    double own = top * std::max(near * std::exp(-(rho + centre[1]) / (2 * lambda)), 1e-12);
    const CurveTable& here = *materials[static_cast<std::size_t>(mesh.soil[i])].table;
    if (&here != &table)
      own = std::max(here.potential_of_head(table.head_of_u(table.u_of_potential(own))), 1e-300);
    if (setup.water_table)
      own = std::max(own, here.potential_of_head(-*setup.water_table - mesh.elevation[i]));
    Phi.push_back(own);
  }
  return Phi;
}

std::vector<Condition> conditions_of(const TestSetup& setup, const SteadyHeads& heads,
                                     const CellsAndFaces& mesh, const RingPatches& patch) {
  std::vector<Condition> conditions = ground_conditions(mesh, setup);
  if (heads.ring) conditions[patch.ring] = Condition::constant(Boundary::head, *heads.ring);
  if (heads.outer && patch.annulus)
    conditions[*patch.annulus] = Condition::constant(Boundary::head, *heads.outer);
  return conditions;
}

// Start of the long way: drained ground, at rest over a water table.
std::vector<double> drained_ground(const TestSetup& setup, const CellsAndFaces& mesh,
                                   const FlowSystem& flow) {
  constexpr double kDrained = -10.0;  // [m]
  std::vector<double> u;
  for (int i = 0; i < flow.cells(); ++i) {
    const double z = mesh.elevation[static_cast<std::size_t>(i)];
    const double head = setup.water_table ? -*setup.water_table - z : kDrained;
    u.push_back(flow.u_of_head(i, std::max(head, kDrained)));
  }
  return u;
}

TestSetup setup_of(const SteadyRing& problem) {
  TestSetup setup;
  setup.soil = problem.soil;
  setup.ring = problem.ring;
  setup.pond_head = problem.pond_head;
  return setup;
}

}  // namespace

SteadyFlow steady_flow(const TestSetup& setup, const SteadyHeads& heads,
                       const Resolution& resolution, const std::vector<Material>& materials,
                       const Domain& domain) {
  // No front to resolve: the thin uppermost cells of the transient mesh are not needed.
  Resolution steady = resolution;
  steady.top_cell = std::max(steady.top_cell, steady.tip_cell);
  const CellsAndFaces mesh = ring_mesh(setup, domain, steady);
  const RingPatches patch = ring_patches(mesh);
  std::vector<double> Phi = first_potentials(setup, heads, mesh, materials);
  FlowSystem flow(mesh, materials, conditions_of(setup, heads, mesh, patch));
  SteadyResult found = solve_steady(flow, Phi);
  if (!found.converged) found = settle(flow, drained_ground(setup, mesh, flow));
  if (!found.converged)
    throw SolverFailure(
        "no steady flow found after " + std::to_string(found.iterations) + " Newton iterations",
        0.0, 0.0, {});
  const auto out = flow.patch_outflow();
  SteadyFlow result;
  result.ring_flow = -out[patch.ring];
  result.outer_flow = patch.annulus ? -out[*patch.annulus] : 0.0;
  result.seepage_flow = out[patch.outside];
  result.iterations = found.iterations;
  result.cells = flow.cells();
  double net = 0.0;
  for (double q : out) net += q;
  result.balance_error = std::abs(net) / (result.ring_flow + result.outer_flow);
  return result;
}

SteadyFlow steady_flow(const TestSetup& setup, const SteadyHeads& heads,
                       const Resolution& resolution, const std::vector<Material>& materials) {
  return steady_flow(setup, heads, resolution, materials,
                     steady_domain(setup, materials.front().table->capillary_length()));
}

SteadyFlow steady_flow(const SteadyRing& problem, const Resolution& resolution,
                       std::shared_ptr<const CurveTable> table, const Domain& domain) {
  return steady_flow(setup_of(problem), {problem.pond_head}, resolution,
                     {{problem.soil, std::move(table)}}, domain);
}

SteadyFlow steady_flow(const SteadyRing& problem, const Resolution& resolution,
                       std::shared_ptr<const CurveTable> table) {
  const Domain domain = steady_domain(problem.ring, table->capillary_length());
  return steady_flow(problem, resolution, std::move(table), domain);
}

}  // namespace ringwright::solver
