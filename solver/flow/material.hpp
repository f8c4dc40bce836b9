#pragma once
#include <memory>

#include "models/soil/curves.hpp"
#include "solver/flow/curve_table.hpp"

namespace ringwright::solver {

/// A soil with the table of its curves.
struct Material {
  models::Soil soil;
  std::shared_ptr<const CurveTable> table;
};

}  // namespace ringwright::solver
