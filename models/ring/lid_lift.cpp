#include "models/ring/lid_lift.hpp"

#include <algorithm>
#include <cmath>
#include <numbers>
#include <stdexcept>

#include "models/water/density.hpp"

namespace ringwright::models {

double lid_force(double head, double seal_radius) {
  if (!(head >= 0.0)) throw std::invalid_argument("a head under a lid must not be below 0");
  if (!(seal_radius > 0.0)) throw std::invalid_argument("the radius of a seal must be above 0");
  return water_weight_at_20() * head * std::numbers::pi * seal_radius * seal_radius;
}

double ballast_mass(double force, double mass, double factor) {
  if (!(mass >= 0.0)) throw std::invalid_argument("a mass must not be below 0");
  if (!(factor >= 1.0)) throw std::invalid_argument("a factor on the lift must be 1 or more");
  return std::max(factor * force / standard_gravity - mass, 0.0);
}

int ballast_pieces(double mass) {
  // A mass of whole pieces needs no further one for rounding's sake.
  return static_cast<int>(std::ceil(mass / heaviest_piece - 1e-9));
}

LidLift lid_lift(const Lid& lid, double highest_head, double inner_radius, double factor) {
  const double radius = lid.seal_radius.value_or(inner_radius);
  if (!(radius >= inner_radius))
    throw std::invalid_argument("a seal lies at the ring's inner radius or outside it");
  LidLift lift;
  lift.force = lid_force(std::max(highest_head - lid.underside, 0.0), radius);
  lift.net_force = lift.force - lid.weight * standard_gravity;
  lift.ballast = ballast_mass(lift.force, lid.weight, factor);
  lift.pieces = ballast_pieces(lift.ballast);
  return lift;
}

}  // namespace ringwright::models
