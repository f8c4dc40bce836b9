#pragma once
/// Steady flow out of a ring in saturated ground without gravity, where only geometry and
/// conductivities count; for checks of what the mesh does with them.

#include <catch2/catch.hpp>

#include "solver/flow/flow_system.hpp"
#include "solver/flow/steady_newton.hpp"
#include "solver/ground_materials.hpp"
#include "solver/mesh/ring_mesh.hpp"

namespace ringwright::validation {

/// Into the ground through the (inner) ring [m3/s]: its head against 1 cm at bottom and side, the
/// surface outside closed.
inline double saturated_ring_flow(const solver::TestSetup& setup,
                                  const std::vector<solver::Material>& materials,
                                  const solver::Domain& domain,
                                  const solver::Resolution& resolution) {
  using namespace solver;
  constexpr double far = 0.01;
  const CellsAndFaces mesh = without_gravity(ring_mesh(setup, domain, resolution));
  std::vector<Condition> conditions(mesh.patches.size());
  for (std::size_t p = 0; p < mesh.patches.size(); ++p)
    if (mesh.patches[p] == "ring")
      conditions[p] = Condition::constant(Boundary::head, far + setup.pond_head);
    else if (mesh.patches[p] == "bottom" || mesh.patches[p] == "side")
      conditions[p] = Condition::constant(Boundary::head, far);
  std::vector<double> Phi;
  for (int soil : mesh.soil)
    Phi.push_back(materials[static_cast<std::size_t>(soil)].table->potential_of_head(far));
  FlowSystem flow(mesh, materials, conditions);
  REQUIRE(solve_steady(flow, Phi).converged);
  return -flow.patch_outflow()[0];
}

}  // namespace ringwright::validation
