#pragma once
/// What is timed and counted, as functions with names of their own that a profiler can find.

#include <memory>

#include "postprocess/reading/answer.hpp"
#include "solver/steady_ring.hpp"
#include "validation/benchmark/benchmark_case.hpp"

namespace ringwright::solver {
class CurveTable;
}

namespace ringwright::validation {

using Table = std::shared_ptr<const solver::CurveTable>;

/// Table, mesh and run.
solver::TestRun measured_cold(const solver::TestSetup& setup, const solver::Resolution& resolution);
/// Mesh and run with a table made before.
solver::TestRun measured_cached(const solver::TestSetup& setup,
                                const solver::Resolution& resolution, const Table& table);
/// Mesh and root of the steady flow, with a table made before.
solver::SteadyFlow measured_steady(const solver::TestSetup& setup,
                                   const solver::Resolution& resolution, const Table& table);
/// From the question to every figure of the screen: table, meshes, companion runs, steady flows,
/// estimated errors, refinement if one was needed.
postprocess::Answer measured_answer(const solver::TestSetup& setup, double accuracy);

}  // namespace ringwright::validation
