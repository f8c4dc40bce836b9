#include "models/theory/srivastava_yeh.hpp"

#include <catch2/catch.hpp>
#include <cmath>
#include <stdexcept>

using namespace ringwright::models;

namespace {

struct Point {
  double z, t, K;
};

// Inverse Laplace transform of the column's solution, which knows nothing of the roots: Talbot's
// contour with 60 terms and 40 digits in Python's mpmath. The first also computed for this
// project by an independent prototype: 0.831465.
constexpr Point kWetting[] = {  // L* 10, q_A 0.1, q_B 0.9
    {9, 5, 0.8314651501294},  {5, 1, 0.1070221831853},  {9.5, .2, 0.233652228936},
    {3, 10, 0.7376007099491}, {10, 2, 0.7794972065868}, {1, 20, 0.9290729790785}};
constexpr Point kDrying[] = {  // L* 2, q_A 0.5, q_B 0.2
    {1, .5, 0.6222587831096},
    {2, 1, 0.3522862057733}};

}  // namespace

TEST_CASE("Srivastava & Yeh: conductivities while wetting and drying", "[theory]") {
  for (const Point& at : kWetting) {
    INFO("z " << at.z << " t " << at.t);
    CHECK(srivastava_yeh_conductivity({10, 0.1, 0.9}, at.z, at.t) == Approx(at.K).epsilon(1e-11));
  }
  for (const Point& at : kDrying) {
    INFO("z " << at.z << " t " << at.t);
    CHECK(srivastava_yeh_conductivity({2, 0.5, 0.2}, at.z, at.t) == Approx(at.K).epsilon(1e-11));
  }
}

TEST_CASE("Srivastava & Yeh: steady before and long after, saturated at the water table",
          "[theory]") {
  // Steady flow q* above a water table: K* = q* - (q* - 1) exp(-z*), by integration of Darcy's law.
  const SrivastavaYehProblem problem{10, 0.1, 0.9};
  CHECK(srivastava_yeh_conductivity(problem, 4, 0) == Approx(0.1 + 0.9 * std::exp(-4.0)));
  CHECK(srivastava_yeh_conductivity(problem, 4, 1e-3) ==
        Approx(0.1 + 0.9 * std::exp(-4.0)).epsilon(1e-10));
  CHECK(srivastava_yeh_conductivity(problem, 4, 300) == Approx(0.9 + 0.1 * std::exp(-4.0)));
  CHECK(srivastava_yeh_conductivity(problem, 0, 3) == Approx(1.0));
}

TEST_CASE("Srivastava & Yeh: values out of range are refused", "[theory]") {
  CHECK_THROWS_AS(srivastava_yeh_conductivity({10, 0.1, 0.9}, 11, 1), std::invalid_argument);
  CHECK_THROWS_AS(srivastava_yeh_conductivity({10, 0.1, 0.9}, 5, -1), std::invalid_argument);
  CHECK_THROWS_AS(srivastava_yeh_conductivity({0, 0.1, 0.9}, 0, 1), std::invalid_argument);
}
