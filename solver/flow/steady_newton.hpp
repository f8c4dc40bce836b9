#pragma once
/// Root of the steady flow equation in the flux potential; knows cells and faces only.

#include <span>
#include <vector>

#include "solver/flow/flow_system.hpp"

namespace ringwright::solver {

struct SteadyResult {
  bool converged = false;
  int iterations = 0;
  double largest_defect = 0.0;  ///< net outflow of a cell over the total inflow [-]
};

/// Improves the potentials Phi [m] (one per cell, all > 0) until the flow is steady; the flow
/// system then holds the state.
SteadyResult solve_steady(FlowSystem& flow, std::span<double> Phi);

}  // namespace ringwright::solver
