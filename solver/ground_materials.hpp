#pragma once
/// The materials a test's ground is made of, in the order of the soil indices of its mesh.
///
///   0           the uppermost soil
///   1 ... L     the layers below it
///   L+1 ...     the same, disturbed along the wall (only if the setup has disturbed soil)
///   last        the gap along the wall (only if the setup has one)

#include <memory>
#include <vector>

#include "solver/flow/material.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::solver {

/// Soil index of layer `layer` (0: the uppermost).
int layer_index(const TestSetup& setup, int layer);
/// Soil index of layer `layer` where it is disturbed. @throws std::invalid_argument without any
int disturbed_index(const TestSetup& setup, int layer);
/// Soil index of the gap. @throws std::invalid_argument without one
int gap_index(const TestSetup& setup);

/// @param table of the uppermost soil, if one was made before; soils with the same curves share one
std::vector<Material> ground_materials(const TestSetup& setup,
                                       std::shared_ptr<const CurveTable> table = nullptr);

/// Pressure head before the test at an elevation in a soil index [m].
double head_before(const TestSetup& setup, int soil_index, double elevation);

}  // namespace ringwright::solver
