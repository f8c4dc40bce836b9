#include "models/estimators/reynolds_elrick_single_head.hpp"

#include <array>
#include <limits>
#include <numbers>
#include <stdexcept>

namespace ringwright::models {
namespace {

constexpr double kNone = std::numeric_limits<double>::infinity();

constexpr std::array<PublishedLimit, 5> kLimits{{
    {"head", 0.05, kNone, "m"},
    {"insertion", 0.03, kNone, "m"},
    {"insertion over radius", 0.25, 1.0, "1"},
    {"radius", 0.05, 0.10, "m"},
    {"alpha*", 1.0, 50.0, "1/m"},
}};

void check(const SteadyRing& test, double alpha_star) {
  if (!(test.rate >= 0.0)) throw std::invalid_argument("a rate must not be below 0");
  if (!(test.head >= 0.0)) throw std::invalid_argument("a head must not be below 0");
  if (!(test.insertion >= 0.0)) throw std::invalid_argument("an insertion must not be below 0");
  if (!(test.radius > 0.0)) throw std::invalid_argument("a radius must be above 0");
  if (!(alpha_star > 0.0)) throw std::invalid_argument("alpha* must be above 0");
}

}  // namespace

double reynolds_elrick_shape(double insertion_over_radius) {
  return 0.316 * insertion_over_radius + 0.184;
}

double reynolds_elrick_single_head(const SteadyRing& test, double alpha_star) {
  check(test, alpha_star);
  const double G = reynolds_elrick_shape(test.insertion / test.radius);
  const double length = std::numbers::pi * test.radius * G;
  return test.rate / (1.0 + (test.head + 1.0 / alpha_star) / length);
}

std::span<const PublishedLimit> reynolds_elrick_limits() { return kLimits; }

std::vector<LimitBroken> reynolds_elrick_limits_broken(const SteadyRing& test, double alpha_star) {
  check(test, alpha_star);
  const std::array<double, 5> values{test.head, test.insertion, test.insertion / test.radius,
                                     test.radius, alpha_star};
  return limits_broken(kLimits, values);
}

}  // namespace ringwright::models
