#pragma once
#include <vector>

#include "solver/flow/flow_system.hpp"
#include "solver/mesh/cells_and_faces.hpp"

namespace ringwright::validation {

/// Depth [m] at which a quantity of the unknown falls through a level, linear between the centres
/// of a column, from the surface downwards.
template <typename Quantity>
double depth_of(const solver::CellsAndFaces& column, const std::vector<double>& u, double level,
                Quantity quantity) {
  const std::vector<double>& z = column.elevation;
  for (std::size_t i = 1; i < u.size(); ++i) {
    const double above = quantity(u[i - 1]), below = quantity(u[i]);
    if (above >= level && below < level)
      return -(z[i - 1] + (above - level) / (above - below) * (z[i] - z[i - 1]));
  }
  return 0.0;
}

}  // namespace ringwright::validation
