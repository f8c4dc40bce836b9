#pragma once
/// The ring tests that the benchmark times, and what their results are compared with.

#include <string>
#include <string_view>
#include <vector>

#include "solver/virtual_test.hpp"

namespace ringwright::validation {

struct ReferenceRow {
  double time = 0.0;    ///< [s]
  double volume = 0.0;  ///< into the soil since the start [m3]
  double flow = 0.0;    ///< [m3/s]
};

struct BenchmarkCase {
  std::string name;
  std::string what;
  solver::TestSetup setup;         ///< its times are those of the rows
  std::vector<ReferenceRow> rows;  ///< ascending, the last one at the end
  double steady_flow = 0.0;        ///< [m3/s]
  bool own_reference = false;      ///< rows are a run of our own at accuracy 0.05 %

  /// When the first volume is promised: 5 % of the duration [s].
  double first_time() const { return 0.05 * setup.duration; }
};

/// Largest relative difference from the rows.
struct WorstError {
  double volume = 0.0;  ///< from 5 % of the duration [-]
  double flow = 0.0;    ///< from 25 % of the duration [-]
};

/// Names in the order they are printed.
std::vector<std::string> benchmark_names();

/// The case with its rows and steady flow.
/// @throws std::invalid_argument for an unknown name
BenchmarkCase benchmark_case(std::string_view name);
/// The same; where the rows would be a run of our own they are left out.
BenchmarkCase benchmark_case_without_own_run(std::string_view name);

solver::Resolution resolution_of(const BenchmarkCase& c, double accuracy);

WorstError worst_error(const BenchmarkCase& c, const solver::TestRun& run);

}  // namespace ringwright::validation
