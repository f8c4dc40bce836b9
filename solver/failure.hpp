#pragma once
#include <array>
#include <stdexcept>
#include <string>
#include <vector>

namespace ringwright::solver {

/// A cell that resists, for the message.
struct WorstCell {
  int cell = 0;
  std::array<double, 2> centre{};  ///< (r, z) [m]
  double head = 0.0;               ///< [m]
  double size = 0.0;               ///< its error over the tolerance [-]
};

/// The numerical solution could not go on. What was computed before stays valid.
class SolverFailure : public std::runtime_error {
 public:
  SolverFailure(const std::string& cause, double at_time, double step_size,
                std::vector<WorstCell> cells)
      : std::runtime_error(cause), time(at_time), step(step_size), worst(std::move(cells)) {}

  double time;                   ///< reached [s]
  double step;                   ///< last step tried [s]
  std::vector<WorstCell> worst;  ///< largest first
};

}  // namespace ringwright::solver
