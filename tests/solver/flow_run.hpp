#pragma once
/// A flow system taken through time from one state, for tests and published checks.

#include <algorithm>
#include <memory>
#include <span>
#include <vector>

#include "solver/flow/flow_system.hpp"
#include "solver/time/integrator.hpp"

namespace ringwright::solver {

/// Totals of each patch since the start and the state, at one time [s].
struct FlowRecord {
  double time = 0.0;
  std::vector<double> volumes;  ///< out of the ground [m3]
  std::vector<double> flows;    ///< out of the ground [m3/s]
  std::vector<double> u;
};

struct FlowRun {
  std::vector<FlowRecord> records;  ///< one per time wanted
  IntegratorStatistics statistics;
};

inline std::vector<double> uniform_state(const FlowSystem& flow, double head) {
  return std::vector<double>(static_cast<std::size_t>(flow.cells()), flow.table(0).u_of_head(head));
}

/// Water in the ground above the residual content [m3].
inline double stored_water(FlowSystem& flow, std::span<const double> u) {
  double sum = 0.0;
  for (std::size_t i = 0; i < u.size(); ++i)
    sum += flow.volume()[i] * flow.storage_of_u(static_cast<int>(i), u[i]);
  return sum;
}

inline FlowRecord record_now(const Integrator& integrator, std::size_t patches) {
  FlowRecord r;
  r.time = integrator.time();
  r.volumes.resize(patches);
  r.flows.resize(patches);
  integrator.totals_at(r.time, r.volumes, r.flows);
  r.u.assign(integrator.u().begin(), integrator.u().end());
  return r;
}

/// Steps that end exactly at each of the times [s], ascending.
inline FlowRun run_flow(FlowSystem& flow, double theta_tolerance, std::span<const double> start,
                        const std::vector<double>& times) {
  Integrator integrator(flow, theta_tolerance);
  integrator.start(0.0, start);
  FlowRun run;
  for (double t : times) {
    while (integrator.time() < t) integrator.step(t);
    run.records.push_back(record_now(integrator, static_cast<std::size_t>(flow.patches())));
  }
  run.statistics = integrator.statistics();
  return run;
}

/// n cells of equal height from the surface to -depth.
inline std::vector<double> equal_edges(double from, double to, int n) {
  std::vector<double> edges;
  for (int i = 0; i <= n; ++i) edges.push_back(from + (to - from) * i / n);
  return edges;
}

}  // namespace ringwright::solver
