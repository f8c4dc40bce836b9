#pragma once
/// The range a formula was published for, as data, and what of a test lies outside it.

#include <span>
#include <string_view>
#include <vector>

namespace ringwright::models {

/// What a formula for steady flow from a single ring is given.
struct SteadyRing {
  double rate = 0.0;       ///< steady infiltration rate, flow over the ring's area [m/s]
  double head = 0.0;       ///< pond depth H [m]
  double radius = 0.0;     ///< inner radius of the ring a [m]
  double insertion = 0.0;  ///< depth of the wall d [m]
};

/// Limits, both inclusive, of one quantity.
struct PublishedLimit {
  std::string_view quantity;  ///< "insertion over radius"
  double lowest = 0.0;        ///< SI; minus infinity for none
  double highest = 0.0;       ///< SI; infinity for none
  std::string_view unit;      ///< SI unit of both: "m", "1/m", "1" for ratios
};

/// A quantity outside its published limits.
struct LimitBroken {
  PublishedLimit limit;
  double value = 0.0;  ///< SI
};

/// The limits that `values` break. @param values one per limit, same order
std::vector<LimitBroken> limits_broken(std::span<const PublishedLimit> limits,
                                       std::span<const double> values);

}  // namespace ringwright::models
