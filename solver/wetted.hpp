#pragma once
/// How far the water of a test has come in the ground, on a structured section.

#include <span>
#include <vector>

#include "solver/flow/flow_system.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::solver {

/// Compares the ground now with the ground before.
class WettedGround {
 public:
  /// @param before storage of each cell before the test [-] @param wall_radius of the outermost
  /// ring [m]
  WettedGround(const FlowSystem& flow, const Drawing& drawing, std::vector<double> before,
               double wall_radius);

  /// @param storage of each cell now [-]
  Wetted extent(std::span<const double> storage) const;
  /// Whether theta moved at the outer faces otherwise than by draining everywhere alike.
  bool reached_the_edge(std::span<const double> storage) const;

 private:
  std::size_t columns() const { return columns_; }
  double fillable(std::size_t cell) const;
  double limit(std::size_t cell, std::span<const double> storage) const;

  const FlowSystem& flow_;
  const Drawing& drawing_;
  std::vector<double> before_;
  double wall_radius_;
  std::size_t columns_ = 0;
};

}  // namespace ringwright::solver
