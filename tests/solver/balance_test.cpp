#include <catch2/catch.hpp>

#include "models/soil/van_genuchten.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "solver/virtual_test.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

constexpr double hour = 3600.0;

/// The soil of a class without minimum capillary height, as the open reference cases have it.
models::Soil open_soil(double theta_r, double theta_s, double alpha, double n, double Ks) {
  return {std::make_shared<models::VanGenuchten>(alpha, n), theta_r, theta_s, Ks, 0.0};
}

double balance_error(const TestSetup& setup, double accuracy) {
  const auto table = std::make_shared<CurveTable>(setup.soil.curves);
  const Resolution r =
      resolution_for(setup, accuracy, table->capillary_length(), setup.times.front());
  return run_test(setup, r, table).statistics.balance_error;
}

}  // namespace

// Cases T1 and T4 of validation/open_reference/reference.json; the bound is the one promised for
// the reference cases.
TEST_CASE("water balance of the reference cases within 1e-6 of the throughput", "[solver]") {
  TestSetup T1;
  T1.soil = open_soil(0.078, 0.43, 3.6, 1.56, 0.0104 / hour);
  T1.initial_head = -3.0;
  T1.ring = {0.15, 0.05, 0.003};
  T1.pond_head = 0.10;
  T1.duration = 8 * hour;
  T1.times = {0.4 * hour, 8 * hour};
  TestSetup T4;
  T4.soil = open_soil(0.045, 0.43, 14.5, 2.68, 0.297 / hour);
  T4.initial_head = -0.60;
  T4.ring = {0.075, 0.05, 0.003};
  T4.pond_head = 0.05;
  T4.duration = 2 * hour;
  T4.times = {0.1 * hour, 2 * hour};
  for (double accuracy : {0.01, 0.003}) {
    CAPTURE(accuracy);
    CHECK(balance_error(T1, accuracy) <= 1e-6);
    CHECK(balance_error(T4, accuracy) <= 1e-6);
  }
}

TEST_CASE("water balance of every class, dry to wet, within 1e-5 of the throughput", "[solver]") {
  for (std::string_view texture : models::texture_classes())
    for (double head : {-0.3, -3.0, -30.0}) {
      TestSetup s;
      s.soil = class_soil(texture);
      s.initial_head = head;
      s.ring = {0.10, 0.05, 0.003};
      s.pond_head = 0.05;
      s.duration = 2 * hour;
      s.times = {0.1 * hour, 2 * hour};
      CAPTURE(texture, head);
      CHECK(balance_error(s, 0.01) <= 1e-5);
    }
}
