#include "models/ground/wall_gap.hpp"

#include <cmath>
#include <memory>
#include <stdexcept>

#include "models/soil/brooks_corey.hpp"
#include "models/water/density.hpp"
#include "models/water/surface_tension.hpp"
#include "models/water/viscosity.hpp"

namespace ringwright::models {
namespace {

// A gap of one width empties at one suction, all at once. A fall as (h_b/h)^3 is steep beside any
// soil's and still soft enough for Newton's method; common practice, no source.
constexpr double kPoreSizeIndex = 3.0;

}  // namespace

Soil wall_gap_material(double width, double viscosity_ratio) {
  if (!(width > 0.0) || std::isinf(width))
    throw std::invalid_argument("the width of a gap must be above 0");
  if (!(viscosity_ratio > 0.0) || std::isinf(viscosity_ratio))
    throw std::invalid_argument("a viscosity ratio must be above 0");
  const double weight = water_weight_at_20();
  const double entry_suction = 2.0 * water_surface_tension(20.0) / (weight * width);
  Soil gap;
  gap.curves = std::make_shared<BrooksCorey>(-entry_suction, kPoreSizeIndex);
  gap.theta_s = 1.0;
  gap.Ks = weight * width * width / (12.0 * water_viscosity(20.0) * viscosity_ratio);
  return gap;
}

}  // namespace ringwright::models
