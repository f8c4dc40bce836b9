#pragma once
/// The lines between which the cells of a ring mesh lie.

#include <vector>

#include "solver/domain.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::solver {

/// Edges in r, ascending from 0 [m]: graded from the walls, from the strips under rings that stand
/// on the surface, and from the borders of gap and disturbed soil. A gap is one column.
std::vector<double> ring_radii(const TestSetup& setup, const Domain& domain,
                               const Resolution& resolution);

/// Edges in z, descending from 0 [m]: graded from the surface, from the feet of the walls, from the
/// tops of layers and from a water table.
std::vector<double> ring_elevations(const TestSetup& setup, const Domain& domain,
                                    const Resolution& resolution);

}  // namespace ringwright::solver
