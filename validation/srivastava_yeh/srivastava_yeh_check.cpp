/// A change of rain over a water table: transient drainage and wetting of a linear column.
///
/// Srivastava & Yeh 1991, Water Resour. Res. 27:753, homogeneous soil; the start is the steady
/// profile under the flux q_A, q_B falls from t = 0 on, h = 0 at the bottom:
///   K*(z, 0) = q_A - (q_A - 1) exp(-z*).

#include <catch2/catch.hpp>
#include <cmath>

#include "models/soil/gardner.hpp"
#include "solver/mesh/axisymmetric.hpp"
#include "tests/solver/flow_run.hpp"
#include "validation/exact_points/points.hpp"
#include "validation/order.hpp"

using namespace ringwright;
using namespace ringwright::solver;
using nlohmann::json;

namespace {

struct WettingColumn {
  json exact = validation::exact_points("srivastava_yeh");
  double q_A = exact["q_A_star"], q_B = exact["q_B_star"], L_star = exact["L_star"];
  double alpha = 10.0;  // [1/m]; any other gives the same numbers
  models::Soil soil{std::make_shared<models::Gardner>(alpha), 0.06, 0.40, 2e-6, 0.0};
  std::shared_ptr<const CurveTable> table = std::make_shared<CurveTable>(soil.curves);

  /// Largest error of K* at the points of the table.
  double worst_error(int n, double theta_tolerance) const {
    const double L = L_star / alpha;
    const CellsAndFaces mesh = column_mesh(equal_edges(0.0, -L, n));
    FlowSystem flow(mesh, soil, table,
                    {Condition::constant(Boundary::flux, q_B * soil.Ks),
                     Condition::constant(Boundary::head, 0.0)});
    std::vector<double> u, times;
    for (double z : mesh.elevation)
      u.push_back(table->u_of_saturation(q_A - (q_A - 1) * std::exp(-alpha * (z + L))));
    for (const json& row : exact["points"]) {
      const double t =
          row["t_star"].get<double>() * (soil.theta_s - soil.theta_r) / (alpha * soil.Ks);
      if (times.empty() || t > times.back()) times.push_back(t);
    }
    const FlowRun run = run_flow(flow, theta_tolerance, u, times);
    double worst = 0.0;
    for (const json& row : exact["points"]) {
      const double t =
          row["t_star"].get<double>() * (soil.theta_s - soil.theta_r) / (alpha * soil.Ks);
      const auto i =
          static_cast<std::size_t>(std::lower_bound(times.begin(), times.end(), t) - times.begin());
      const double K = value_at(mesh, run.records[i].u, row["z_star"].get<double>() / alpha - L);
      worst = std::max(worst, std::abs(K - row["K_star"].get<double>()));
    }
    return worst;
  }

  /// Linear between centres, from the two next ones at the ends.
  double value_at(const CellsAndFaces& mesh, const std::vector<double>& u, double z) const {
    const std::vector<double>& centre = mesh.elevation;
    std::size_t k = 1;
    while (k + 1 < centre.size() && centre[k] > z) ++k;
    const double w = (centre[k - 1] - z) / (centre[k - 1] - centre[k]);
    return (1 - w) * table->at(u[k - 1]).K + w * table->at(u[k]).K;
  }
};

}  // namespace

TEST_CASE("rain over a water table: every point of the exact solution to 1e-4", "[column]") {
  // the series of the paper evaluated by hand-written code of its own, t* = 5, z* = 9
  const WettingColumn c;
  bool found = false;
  for (const json& row : c.exact["points"])
    if (row["t_star"] == 5.0 && row["z_star"] == 9.0) {
      found = true;
      CHECK(row["K_star"].get<double>() == Approx(0.831465).margin(5e-7));
    }
  CHECK(found);
  CHECK(c.worst_error(800, 1e-6) < 1e-4);
}

TEST_CASE("rain over a water table: second order in the cell height", "[column][convergence]") {
  const WettingColumn c;
  std::vector<double> sizes, errors;
  for (int n : {50, 100, 200}) {
    sizes.push_back(1.0 / n);
    errors.push_back(c.worst_error(n, 1e-7));
  }
  CAPTURE(errors);
  CHECK(validation::measured_order(sizes, errors) > 1.7);
}
