#include "models/estimators/two_head.hpp"

#include <numbers>
#include <stdexcept>

#include "models/estimators/reynolds_elrick_single_head.hpp"

namespace ringwright::models {
namespace {

void check_ring(double radius, double insertion) {
  if (!(radius > 0.0)) throw std::invalid_argument("a radius must be above 0");
  if (!(insertion >= 0.0)) throw std::invalid_argument("an insertion must not be below 0");
}

}  // namespace

double nimmo_shape_length(double radius, double insertion) {
  check_ring(radius, insertion);
  return 0.993 * insertion + 0.578 * radius;
}

double reynolds_elrick_shape_length(double radius, double insertion) {
  check_ring(radius, insertion);
  return std::numbers::pi * radius * reynolds_elrick_shape(insertion / radius);
}

TwoHeadResult two_head(const HeadAndRate& one, const HeadAndRate& other, double shape_length) {
  if (!(shape_length > 0.0)) throw std::invalid_argument("a shape length must be above 0");
  if (!(one.head != other.head)) throw std::invalid_argument("the two heads must differ");
  const double D = shape_length, rise = other.head - one.head;
  return {D * (other.rate - one.rate) / rise,
          D * (one.rate * (D + other.head) - other.rate * (D + one.head)) / rise};
}

}  // namespace ringwright::models
