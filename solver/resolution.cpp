#include "solver/resolution.hpp"

#include <algorithm>
#include <cmath>

#include "solver/domain.hpp"

namespace ringwright::solver {

Resolution resolution_for(const TestSetup& setup, double accuracy, double capillary_length,
                          double first_time) {
  const double a = setup.ring.radius, d = setup.ring.insertion, lambda = capillary_length;
  Resolution r;
  r.splits = 0;
  r.tip_cell = std::sqrt(4 * accuracy * a * (d > 0.0 ? std::min(d, lambda) : lambda));
  r.tip_cell = std::min({r.tip_cell, a / 4, lambda / 2});
  r.tip_cell = std::min(r.tip_cell, d > 0.0 ? d / 2 : setup.ring.wall / 2);
  const double wetted = wetted_depth_estimate(setup, lambda, first_time);
  r.top_cell = std::min(0.035 * std::sqrt(accuracy / 0.01) * wetted, 2 * r.tip_cell);
  const double finer = std::pow(accuracy / 0.01, 0.35);
  r.growth = std::pow(1.82, finer);
  r.growth_down = std::pow(1.47, finer);
  r.growth_inside = std::pow(1.26, finer);
  const double fillable = setup.soil.theta_s - setup.soil.water_content(setup.initial_head);
  r.theta_tolerance = std::min(0.01, 0.03 * fillable) * std::min(1.0, accuracy / 0.01);
  return r;
}

}  // namespace ringwright::solver
