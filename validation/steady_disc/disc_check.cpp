/// Steady flow from a disc and from rings in ground whose solution is known.

#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>

#include "models/soil/gardner.hpp"
#include "models/theory/saturated_disc.hpp"
#include "models/theory/wooding_disc.hpp"
#include "solver/flow/flow_system.hpp"
#include "solver/flow/steady_newton.hpp"
#include "solver/mesh/axisymmetric.hpp"
#include "solver/mesh/grading.hpp"
#include "solver/resolution.hpp"
#include "solver/steady_ring.hpp"
#include "validation/reference_file.hpp"

using namespace ringwright;
using namespace ringwright::solver;
using nlohmann::json;

namespace {

constexpr double kRadius = 0.10;  // [m]
constexpr double kKs = 1e-5;      // [m/s]

models::Soil gardner(double alpha) {
  return {std::make_shared<models::Gardner>(alpha), 0.05, 0.40, kKs, 0.0};
}

json disc_rows() {
  const json rows = validation::reference_of("steady_disc")["rows"];
  REQUIRE(rows.size() == 8);
  return rows;
}

// Flow from a disc at head 0 by the program's own steady solver, at an accuracy [m3/s].
double disc_flow(double alpha, double accuracy) {
  TestSetup setup;
  setup.soil = gardner(alpha);
  setup.initial_head = -10.0 / alpha;
  setup.ring = {kRadius, 0.0, 0.003};
  const auto table = std::make_shared<CurveTable>(setup.soil.curves);
  const double scale = 0.35 / alpha / kKs;  // time to wet one capillary length
  const Resolution r = resolution_for(setup, accuracy, 1 / alpha, 0.1 * scale);
  return steady_flow({setup.soil, setup.ring, 0.0}, r, table).ring_flow;
}

// Q/(Ks a H) of a ring driven d into saturated ground without gravity, head 0 far away, the surface
// outside closed. @param tip edge of the cells at the foot of the wall [m]
double saturated_flow_factor(double d, double tip) {
  const double a = kRadius;
  // Without gravity heads count by their difference: all above 0, saturated everywhere.
  const double far_head = 0.01, head = 0.11;
  // The head of the ring's flow at a distance rho is Q/(2 pi Ks rho): held at 0 at 1000 a, it
  // changes Q by 0.07 % at most.
  const double far = 1000 * a;
  std::vector<double> radii = graded_one_end(a, 0.0, tip, 1.2);
  std::reverse(radii.begin(), radii.end());
  radii.front() = 0.0;
  const auto append = [](std::vector<double>& edges, const std::vector<double>& more) {
    edges.insert(edges.end(), more.begin() + (edges.empty() ? 0 : 1), more.end());
  };
  append(radii, graded_one_end(a, far, tip, 1.2));
  std::vector<double> z;
  if (d > 0) append(z, graded_both_ends(0.0, -d, tip, tip, 1.2));
  append(z, graded_one_end(-d, -far, tip, 1.2));
  const CellsAndFaces mesh =
      without_gravity(axisymmetric_mesh(radii, z, {{a, d, true}}, {"ring", "outside"}));
  REQUIRE(mesh.patches == std::vector<std::string>{"ring", "outside", "bottom", "side"});
  const models::Soil soil = gardner(100.0);  // its curves do not count: saturated everywhere
  const auto table = std::make_shared<CurveTable>(soil.curves);
  FlowSystem flow(mesh, soil, table,
                  {Condition::constant(Boundary::head, head),
                   {},
                   Condition::constant(Boundary::head, far_head),
                   Condition::constant(Boundary::head, far_head)});
  std::vector<double> Phi(mesh.volume.size(), table->potential_of_head(head));
  REQUIRE(solve_steady(flow, Phi).converged);
  return -flow.patch_outflow()[0] / (kKs * a * (head - far_head));
}

}  // namespace

// Dual integral equations solved by validation/steady_disc/reference_disc.py.
TEST_CASE("steady disc on a Gardner soil", "[steady]") {
  for (const json& row : disc_rows()) {
    const double alpha = row["alpha_a"].get<double>() / kRadius;
    const double exact = kKs * kRadius / alpha * row["f"].get<double>();
    for (double accuracy : {0.01, 0.003}) {
      const double difference = disc_flow(alpha, accuracy) / exact - 1;
      CAPTURE(alpha * kRadius, accuracy, 100 * difference);
      CHECK(std::abs(difference) <= accuracy + 0.001);
    }
  }
}

// Wooding 1968, Water Resour. Res. 4:1259, is an approximation: it must be off by the error known,
// so that nobody takes it for the reference.
TEST_CASE("Wooding's form is off by its known error", "[steady]") {
  for (const json& row : disc_rows()) {
    const double alpha = row["alpha_a"].get<double>() / kRadius;
    const double wooding = models::wooding_disc_flow(kKs, alpha, kRadius);
    const double known = row["wooding_error_percent"].get<double>() / 100;
    CAPTURE(alpha * kRadius, known);
    const double exact = kKs * kRadius / alpha * row["f"].get<double>();
    CHECK(wooding / exact - 1 == Approx(known).margin(6e-6));  // three decimals of a per cent
    CHECK(std::abs(wooding / disc_flow(alpha, 0.003) - 1 - known) <= 0.003 + 0.001);
  }
}

// Weber 1873, J. reine angew. Math. 75:75 (electrified disc; from memory).
TEST_CASE("saturated disc: Q = 4 Ks a H", "[steady]") {
  const double exact = models::saturated_disc_flow(1.0, 1.0, 1.0);
  REQUIRE(exact == Approx(4.0));
  CHECK(std::abs(saturated_flow_factor(0.0, 0.02 * kRadius) / exact - 1) <= 0.002);
}

// Extrapolated finite volumes made for this project, +-0.05 %.
TEST_CASE("saturated rings", "[steady]") {
  CHECK(std::abs(saturated_flow_factor(0.25 * kRadius, 0.02 * kRadius) / 3.165 - 1) <= 0.002);
  CHECK(std::abs(saturated_flow_factor(kRadius, 0.02 * kRadius) / 1.864 - 1) <= 0.002);
}
