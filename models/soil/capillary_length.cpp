#include "models/soil/capillary_length.hpp"

#include <stdexcept>

namespace ringwright::models {
namespace {

// Integral of (Kr - background) from h_i to 0, over 1 - Kr_i.
double length_above(const Curves& curves, double h_i, double background) {
  const double rise = 1.0 - curves.relative_conductivity(h_i);
  if (!(h_i < curves.entry_head()) || !(rise > 0.0)) {
    throw std::invalid_argument("a capillary length needs an unsaturated start");
  }
  const double whole = curves.relative_flux_potential(0.0) - curves.relative_flux_potential(h_i);
  return (whole + background * h_i) / rise;
}

}  // namespace

double capillary_length(const Curves& curves) { return curves.relative_flux_potential(0.0); }

double capillary_length(const Curves& curves, double h_i) { return length_above(curves, h_i, 0.0); }

double capillary_length_above_initial(const Curves& curves, double h_i) {
  return length_above(curves, h_i, curves.relative_conductivity(h_i));
}

}  // namespace ringwright::models
