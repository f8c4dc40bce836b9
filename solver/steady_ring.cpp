#include "solver/steady_ring.hpp"

#include <algorithm>
#include <cmath>
#include <string>

#include "solver/failure.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/flow/flow_system.hpp"
#include "solver/flow/steady_newton.hpp"
#include "solver/mesh/ring_mesh.hpp"
#include "solver/ring_patches.hpp"

namespace ringwright::solver {
namespace {

// Start: the steady point source in a Gardner soil (Philip 1968), capped near the ring.
std::vector<double> first_potentials(const SteadyRing& p, const CellsAndFaces& mesh,
                                     const CurveTable& table) {
  const double lambda = table.capillary_length();
  const double top = table.potential_of_head(p.pond_head);
  std::vector<double> Phi;
  for (const auto& centre : mesh.drawing.centres) {
    const double rho = std::hypot(centre[0], centre[1]);
    const double near = std::min(1.0, p.ring.radius / std::max(rho, 1e-12));
    Phi.push_back(top * std::max(near * std::exp(-(rho + centre[1]) / (2 * lambda)), 1e-12));
  }
  return Phi;
}

}  // namespace

SteadyFlow steady_flow(const SteadyRing& problem, const Resolution& resolution,
                       std::shared_ptr<const CurveTable> table, const Domain& domain) {
  // No front to resolve: the thin uppermost cells of the transient mesh are not needed.
  Resolution steady = resolution;
  steady.top_cell = std::max(steady.top_cell, steady.tip_cell);
  const CellsAndFaces mesh = ring_mesh(problem.ring, domain, steady);
  std::vector<double> Phi = first_potentials(problem, mesh, *table);
  FlowSystem flow(mesh, problem.soil, std::move(table), ring_conditions(mesh, problem.pond_head));
  const SteadyResult found = solve_steady(flow, Phi);
  if (!found.converged)
    throw SolverFailure(
        "no steady flow found after " + std::to_string(found.iterations) + " Newton iterations",
        0.0, 0.0, {});
  const auto out = flow.patch_outflow();
  const RingPatches patch = ring_patches(mesh);
  SteadyFlow result;
  result.ring_flow = -out[patch.ring];
  result.seepage_flow = out[patch.outside];
  result.iterations = found.iterations;
  result.cells = flow.cells();
  result.balance_error =
      std::abs(out[patch.ring] + out[patch.outside] + out[patch.bottom]) / result.ring_flow;
  return result;
}

SteadyFlow steady_flow(const SteadyRing& problem, const Resolution& resolution,
                       std::shared_ptr<const CurveTable> table) {
  const Domain domain = steady_domain(problem.ring, table->capillary_length());
  return steady_flow(problem, resolution, std::move(table), domain);
}

}  // namespace ringwright::solver
