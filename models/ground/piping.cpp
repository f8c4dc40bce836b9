#include "models/ground/piping.hpp"

#include <algorithm>
#include <limits>
#include <stdexcept>

#include "models/water/density.hpp"

namespace ringwright::models {
namespace {

void check(double head, double insertion) {
  if (!(head >= 0.0)) throw std::invalid_argument("a head must not be below 0");
  if (!(insertion >= 0.0)) throw std::invalid_argument("an insertion must not be below 0");
}

void check_density(double density) {
  if (!(density > 0.0)) throw std::invalid_argument("a density must be above 0");
}

}  // namespace

double piping_index(double head, double insertion) {
  check(head, insertion);
  if (head == 0.0) return 0.0;
  return insertion > 0.0 ? head / (2.0 * insertion) : std::numeric_limits<double>::infinity();
}

double critical_exit_gradient(double porosity, double grain_density) {
  if (!(porosity > 0.0 && porosity < 1.0))
    throw std::invalid_argument("a porosity must lie between 0 and 1");
  check_density(grain_density);
  return (grain_density / water_density(20.0) - 1.0) * (1.0 - porosity);
}

double fracture_margin(double head, double insertion, double bulk_density) {
  check(head, insertion);
  check_density(bulk_density);
  if (head + insertion == 0.0) return std::numeric_limits<double>::infinity();
  return bulk_density * insertion / (water_density(20.0) * (head + insertion));
}

double fracture_head(double insertion, double bulk_density) {
  check(0.0, insertion);
  check_density(bulk_density);
  return std::max(insertion * (bulk_density / water_density(20.0) - 1.0), 0.0);
}

}  // namespace ringwright::models
