/// Steady Gardner rings against values computed by another route.
///
/// Rule: |difference| <= accuracy + 0.1 % + the row's own uncertainty.

#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>

#include "models/soil/gardner.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "solver/steady_ring.hpp"
#include "validation/reference_file.hpp"

using namespace ringwright;
using namespace ringwright::solver;
using nlohmann::json;

namespace {

constexpr double cm = 0.01;
constexpr double kKs = 1e-5;  // [m/s]; i/Ks does not depend on it

// Relative difference of the computed i/Ks from that of a row.
double difference(const json& row, double accuracy) {
  const double alpha = row["alpha_per_cm"].get<double>() / cm;
  TestSetup setup;
  setup.soil = {std::make_shared<models::Gardner>(alpha), 0.05, 0.40, kKs, 0.0};
  setup.initial_head = -10.0 / alpha;
  setup.ring = {row["a_cm"].get<double>() * cm, row["d_cm"].get<double>() * cm, 0.003};
  setup.pond_head = row["H_cm"].get<double>() * cm;
  const auto table = std::make_shared<CurveTable>(setup.soil.curves);
  const double scale = 0.35 / alpha / kKs;  // time to wet one capillary length
  const Resolution r = resolution_for(setup, accuracy, 1 / alpha, 0.1 * scale);
  const SteadyFlow s = steady_flow({setup.soil, setup.ring, setup.pond_head}, r, table);
  CHECK(s.balance_error <= 1e-6);
  const double area = std::numbers::pi * setup.ring.radius * setup.ring.radius;
  return s.ring_flow / area / kKs / row["i_over_Ks"].get<double>() - 1;
}

void check_rows(const json& rows, double uncertainty_percent) {
  for (const json& row : rows) {
    const double uncertainty = row.value("uncertainty_percent", uncertainty_percent) / 100;
    for (double accuracy : {0.01, 0.003}) {
      const double d = difference(row, accuracy);
      CAPTURE(row.dump(), accuracy, 100 * d);
      CHECK(std::abs(d) <= accuracy + 0.001 + uncertainty);
    }
  }
}

}  // namespace

// validation/open_reference, finite volumes and finite elements; uncertainty 0.02 %.
TEST_CASE("six steady rings of the open reference", "[steady]") {
  const json rows = validation::reference_of("open_reference")["steady_gardner_rings"]["rows"];
  REQUIRE(rows.size() == 6);
  check_rows(rows, 0.02);
}

// validation/steady_rings/reference_fem.py, finite elements for the flux potential.
TEST_CASE("twenty random steady rings", "[steady]") {
  const json rows = validation::reference_of("steady_rings")["rows"];
  REQUIRE(rows.size() == 20);
  check_rows(rows, 0.0);
}
