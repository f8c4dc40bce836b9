/// Ponding at h = 0 on a deep column of a linear soil, against the exact solution.
///
/// Gardner 1958 curves for K and theta make the flow equation linear in K; solution after Philip
/// 1969, Adv. Hydrosci. 5:215, in validation/exact_points.

#include <catch2/catch.hpp>
#include <cmath>

#include "models/soil/gardner.hpp"
#include "solver/mesh/axisymmetric.hpp"
#include "solver/mesh/grading.hpp"
#include "tests/solver/flow_run.hpp"
#include "validation/exact_points/points.hpp"
#include "validation/order.hpp"

using namespace ringwright;
using namespace ringwright::solver;
using nlohmann::json;

namespace {

constexpr double cm = 0.01, day = 86400.0;

struct Column {
  json exact = validation::exact_points("linear_column");
  models::Soil soil{std::make_shared<models::Gardner>(exact["alpha_per_cm"].get<double>() / cm),
                    exact["theta_r"], exact["theta_s"],
                    exact["Ks_cm_per_d"].get<double>() * cm / day, 0.0};
  std::shared_ptr<const CurveTable> table = std::make_shared<CurveTable>(soil.curves);

  std::vector<double> times() const {
    std::vector<double> t;
    for (const json& row : exact["surface"]) t.push_back(row["time_d"].get<double>() * day);
    return t;
  }

  FlowRun run(const std::vector<double>& z, double theta_tolerance) const {
    const CellsAndFaces mesh = column_mesh(z);
    FlowSystem flow(
        mesh, soil, table,
        {Condition::constant(Boundary::head, 0.0), {Boundary::free_drainage, {}, false}});
    const double initial = exact["h_initial_cm"].get<double>() * cm;
    return run_flow(flow, theta_tolerance, uniform_state(flow, initial), times());
  }

  /// Largest relative error of the intake from 0.05 d on.
  double intake_error(const FlowRun& r) const {
    double worst = 0.0;
    for (std::size_t i = 1; i < r.records.size(); ++i)
      worst = std::max(worst, std::abs(relative_intake(r, i) - 1.0));
    return worst;
  }
  double relative_intake(const FlowRun& r, std::size_t i) const {
    return -r.records[i].volumes[0] / (exact["surface"][i]["intake_cm"].get<double>() * cm);
  }
};

}  // namespace

TEST_CASE("linear column: intake, flow and heads of the exact solution to 1e-4", "[column]") {
  const Column c;
  const std::vector<double> z = graded_one_end(0.0, -4.0, 2e-4, 1.008);
  const FlowRun r = c.run(z, 1e-6);
  const std::vector<double> centres = column_mesh(z).elevation;
  for (std::size_t i = 0; i < r.records.size(); ++i) {
    const json& row = c.exact["surface"][i];
    CAPTURE(row.dump(), centres.size());
    CHECK(std::abs(c.relative_intake(r, i) - 1) < 1e-4);
    const double flux = row["flux_cm_per_d"].get<double>() * cm / day;
    CHECK(-r.records[i].flows[0] == Approx(flux).epsilon(1e-4));
  }
  // Heads as what the linear equation is in, exp(alpha h), of a range from 0 to 1.
  for (const json& row : c.exact["heads"]) {
    const auto& at = *std::find_if(r.records.begin(), r.records.end(), [&](const FlowRecord& x) {
      return std::abs(x.time - row["time_d"].get<double>() * day) < 1e-6 * day;
    });
    const double depth = row["depth_cm"].get<double>() * cm;
    std::size_t k = 0;  // cells k - 1 and k lie above and below
    while (-centres[k] < depth) ++k;
    const double w = (depth + centres[k - 1]) / (centres[k - 1] - centres[k]);
    const double K = (1 - w) * c.table->at(at.u[k - 1]).K + w * c.table->at(at.u[k]).K;
    CAPTURE(row.dump());
    CHECK(K == Approx(std::exp(c.exact["alpha_per_cm"].get<double>() * row["h_cm"].get<double>()))
                   .margin(1e-4));
  }
}

// Central differences on equal cells: second order in the cell height.
TEST_CASE("linear column: order of convergence in space", "[column][convergence]") {
  const Column c;
  std::vector<double> sizes, errors;
  for (int n : {200, 400, 800}) {
    sizes.push_back(4.0 / n);
    errors.push_back(c.intake_error(c.run(equal_edges(0.0, -4.0, n), 2e-6)));
  }
  CAPTURE(errors);
  CHECK(validation::measured_order(sizes, errors) > 1.8);
}

// Variable-order formulas keep the error per step at the tolerance: the error falls with it, and
// against the number of steps it falls at least at second order (orders 1 to 3 are used).
TEST_CASE("linear column: order of convergence in time", "[column][convergence]") {
  const Column c;
  const std::vector<double> z = graded_one_end(0.0, -4.0, 5e-4, 1.02);
  const FlowRun exact_in_time = c.run(z, 1e-8);
  std::vector<double> tolerances{1e-2, 1e-3, 1e-4, 1e-5}, steps, errors;
  for (double tolerance : tolerances) {
    const FlowRun r = c.run(z, tolerance);
    double worst = 0.0;
    for (std::size_t i = 1; i < r.records.size(); ++i)
      worst = std::max(worst,
                       std::abs(r.records[i].volumes[0] / exact_in_time.records[i].volumes[0] - 1));
    errors.push_back(worst);
    steps.push_back(1.0 / static_cast<double>(r.statistics.steps));
  }
  CAPTURE(errors, steps);
  for (std::size_t i = 0; i + 1 < errors.size(); ++i) CHECK(errors[i + 1] < errors[i]);
  CHECK(validation::measured_order(tolerances, errors) > 0.6);
  CHECK(validation::measured_order(steps, errors) > 2.0);
}
