#include "solver/flow/switched_newton.hpp"

#include <catch2/catch.hpp>
#include <cmath>
#include <limits>

#include "solver/mesh/axisymmetric.hpp"
#include "tests/solver/flow_run.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

/// One implicit Euler step from a uniform head.
struct EulerStep {
  FlowSystem flow;
  std::vector<double> W, W_rate;

  EulerStep(const models::Soil& soil, std::vector<Condition> conditions, double head,
            int cells = 40)
      : flow(column_mesh(equal_edges(0.0, -0.4, cells)), soil,
             std::make_shared<CurveTable>(soil.curves), std::move(conditions)),
        W(static_cast<std::size_t>(cells), flow.storage_of_u(0, flow.table(0).u_of_head(head))),
        W_rate(W.size(), 0.0) {}

  double balance(double c) {  // storage gained over outflow in the step, relative
    double gained = 0.0, out = 0.0;
    for (std::size_t i = 0; i < W.size(); ++i)
      gained += flow.volume()[i] * (flow.storage(static_cast<int>(i)) - W[i]);
    for (double q : flow.patch_outflow()) out += q / c;
    return std::abs(gained + out) / (std::abs(gained) + std::abs(out));
  }
};

const Condition pond = Condition::constant(Boundary::head, 0.1);
const Condition drain{Boundary::free_drainage, {}, false};

}  // namespace

TEST_CASE("Newton finds the same step from good and from poor guesses", "[solver][flow]") {
  for (const char* texture : {"sand", "loam", "silt", "clay"})
    for (double head : {-0.3, -3.0, -100.0}) {
      const models::Soil soil = class_soil(texture);
      const double fill = soil.theta_s - soil.theta_r;
      const double c = soil.Ks / (0.02 * fill);  // the front moves some two centimetres
      EulerStep s(soil, {pond, drain}, head);
      const CurveTable& table = s.flow.table(0);
      std::vector<double> answer;
      for (double guess : {head, -0.2, -0.001, 0.3, 5.0, -1000.0}) {
        CAPTURE(texture, head, guess);
        SwitchedNewton newton(s.flow, {.storage = 1e-9, .unknown = 1e-9, .iterations = 60});
        std::vector<double> u(s.W.size(), table.u_of_head(guess));
        REQUIRE(newton.solve(s.W, s.W_rate, c, u));
        CHECK(s.balance(c) < 1e-6);
        CHECK(newton.last_iterations() <= 60);
        if (answer.empty()) answer = u;
        for (std::size_t i = 0; i < u.size(); ++i) CHECK(u[i] == Approx(answer[i]).margin(1e-7));
      }
    }
}

TEST_CASE("Newton on a step with no solution reports failure after its iterations",
          "[solver][flow]") {
  // More water into a closed, saturated, rigid column: no state can hold it.
  const models::Soil soil = class_soil("loam");
  EulerStep s(soil, {Condition::constant(Boundary::flux, 1e-5), {}}, 0.2);
  SwitchedNewton newton(s.flow, {.storage = 1e-8, .unknown = 1e-6, .iterations = 20});
  std::vector<double> u(s.W.size(), 0.2);
  CHECK_FALSE(newton.solve(s.W, s.W_rate, 1e-4, u));
  CHECK(newton.iterations() <= 20);
}

TEST_CASE("Newton never accepts a state that is not a number", "[solver][flow]") {
  const double none = std::numeric_limits<double>::quiet_NaN();
  const models::Soil soil = class_soil("loam");
  EulerStep by_boundary(soil, {Condition::constant(Boundary::head, none), drain}, -1.0);
  SwitchedNewton newton(by_boundary.flow, {});
  std::vector<double> u = uniform_state(by_boundary.flow, -1.0);
  CHECK_FALSE(newton.solve(by_boundary.W, by_boundary.W_rate, 1e-3, u));

  EulerStep by_storage(soil, {pond, drain}, -1.0);
  by_storage.W[7] = none;
  SwitchedNewton other(by_storage.flow, {});
  u = uniform_state(by_storage.flow, -1.0);
  CHECK_FALSE(other.solve(by_storage.W, by_storage.W_rate, 1e-3, u));
}

TEST_CASE("Newton keeps its matrix between like steps and forgets it when told", "[solver][flow]") {
  const models::Soil soil = class_soil("loam");
  EulerStep s(soil, {pond, drain}, -3.0);
  SwitchedNewton newton(s.flow, {});
  const double c = soil.Ks / 0.001;
  std::vector<double> u = uniform_state(s.flow, -3.0);
  REQUIRE(newton.solve(s.W, s.W_rate, c, u));
  const long before = newton.factorisations();
  REQUIRE(newton.solve(s.W, s.W_rate, c, u));  // the answer as guess
  CHECK(newton.factorisations() == before);
  newton.reset();
  REQUIRE(newton.solve(s.W, s.W_rate, c, u));
  CHECK(newton.factorisations() > before);
}
