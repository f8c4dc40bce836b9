#pragma once
/// Time integration of the flow equation by IDA (SUNDIALS), variable-order BDF.
///
/// IDA's unknowns are the storage W of each cell and pond and, behind them, the totals of the flow
/// system: the cumulative outflow through each boundary patch, supply and evaporation of each pond;
/// the pressure head is not among them. Each implicit step is solved by SwitchedNewton, given to
/// IDA as its nonlinear solver: the unknown u lives here, is committed after each accepted step and
/// never extrapolated by IDA.
///
/// Choices that matter:
///  - the error test sees W only; totals carry no weight;
///  - a restart (start()) needs nothing but u: W = W(u), W' = -net outflow / V;
///  - after a stop time has been set it must be set again before every step, since IDA 6.4
///    does not clear it.
///
/// One integrator, with its own SUNDIALS context, per simulation and thread.

#include <memory>
#include <span>

#include "solver/flow/flow_system.hpp"

namespace ringwright::solver {

struct IntegratorStatistics {
  long steps = 0, newton_iterations = 0, factorisations = 0, convergence_failures = 0;
  long error_test_failures = 0;
};

class Integrator {
 public:
  /// @param theta_tolerance absolute error of water content per step [-]
  Integrator(FlowSystem& flow, double theta_tolerance);
  ~Integrator();
  Integrator(const Integrator&) = delete;
  Integrator& operator=(const Integrator&) = delete;

  /// Begins at time t [s] from unknowns u [m]; totals start from 0.
  /// @param first_step length of the first step tried [s]; 0: found from the rates
  void start(double t, std::span<const double> u, double first_step = 0.0);
  /// One accepted step, not beyond `stop`. @return the time reached
  /// @throws SolverFailure when it cannot, or after 20000 steps since the start
  double step(double stop);

  double time() const;
  double last_step() const;
  std::span<const double> u() const;
  /// Totals of the flow system since the start [m3] and their rates [m3/s] at t within the last
  /// step.
  void totals_at(double t, std::span<double> volumes, std::span<double> flows) const;
  /// Water stored in all cells at t within the last step [m3].
  double stored_at(double t) const;
  /// Storage W of each cell and pond at t within the last step [-].
  void storage_at(double t, std::span<double> W) const;
  /// Unknowns at t within the last step, linear between its ends.
  void u_at(double t, std::span<double> u) const;
  IntegratorStatistics statistics() const;

 private:
  struct Impl;
  std::unique_ptr<Impl> impl_;
};

}  // namespace ringwright::solver
