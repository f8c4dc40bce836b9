#pragma once
#include <span>

#include "solver/flow/flow_system.hpp"
#include "solver/flow/steady_newton.hpp"

namespace ringwright::solver {

/// Steady state by letting the ground run until what comes in goes out, or until what comes in has
/// not changed for most of the time: slower than solve_steady() and good to some 1e-6, but it arrives on ground of any layers, where Newton's method on the
/// steady equation alone may stall.
/// @param u unknowns to start from, one per cell [m]; the flow system holds the end state
/// @return largest_defect: in minus out over in
SteadyResult settle(FlowSystem& flow, std::span<const double> u);

}  // namespace ringwright::solver
