#pragma once
/// Which material lies where around the walls of a test.

#include "solver/mesh/cells_and_faces.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::solver {

/// Layer a depth [m] lies in (0: the uppermost); on a boundary the lower one.
int layer_at(const TestSetup& setup, double depth);
const models::Soil& layer_soil(const TestSetup& setup, int layer);

/// Soil index (ground_materials.hpp) at a radius and a depth [m]. Next to a wall lies the gap,
/// beyond it, down to the foot, the disturbed soil. The gap closes around the foot, as far below it
/// as it is wide: two gaps that met only at the edge of a thin wall would be joined by an infinite
/// flow there.
int soil_at(const TestSetup& setup, double radius, double depth);

/// Soil index of every cell, by its centre.
void set_soils(const TestSetup& setup, CellsAndFaces& mesh);

}  // namespace ringwright::solver
