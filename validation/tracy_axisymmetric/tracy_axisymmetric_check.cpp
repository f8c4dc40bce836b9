/// Infiltration into a cylinder of linear soil under a head that varies along its top.
///
/// Tracy 2006, Water Resour. Res. 42:W08503, with J0(k1 r) in place of the sine, k1 = j01/R:
///
///   exp(alpha h) = exp(alpha h_r) + (1 - exp(alpha h_r)) J0(k1 r) exp(alpha (L - z)/2) D(z, t)
///   D = sinh(b z)/sinh(b L) + 2/(L c) sum_k (-1)^k l_k/g_k sin(l_k z) exp(-g_k t)
///
/// z up from the bottom, b^2 = alpha^2/4 + k1^2, l_k = k pi/L, g_k = (b^2 + l_k^2)/c,
/// c = alpha (theta_s - theta_r)/Ks; h_r at the bottom, the side and the start.

#include <catch2/catch.hpp>
#include <cmath>
#include <numbers>

#include "models/soil/gardner.hpp"
#include "solver/mesh/axisymmetric.hpp"
#include "tests/solver/flow_run.hpp"
#include "validation/exact_points/points.hpp"
#include "validation/order.hpp"

using namespace ringwright;
using namespace ringwright::solver;
using nlohmann::json;

namespace {

constexpr double cm = 0.01, day = 86400.0;
constexpr double j01 = 2.404825557695773;  // first root of J0 (Abramowitz & Stegun 1964, table 9.5)

struct Cylinder {
  json exact = validation::exact_points("tracy_axisymmetric");
  double R = exact["radius_cm"].get<double>() * cm, L = exact["height_cm"].get<double>() * cm;
  double alpha = exact["alpha_per_cm"].get<double>() / cm;
  double h_r = exact["h_bottom_side_initial_cm"].get<double>() * cm;
  models::Soil soil{std::make_shared<models::Gardner>(alpha), exact["theta_r"], exact["theta_s"],
                    exact["Ks_cm_per_d"].get<double>() * cm / day, 0.0};
  std::shared_ptr<const CurveTable> table = std::make_shared<CurveTable>(soil.curves);
  double dry = std::exp(alpha * h_r);

  /// exp(alpha h) at radius r and elevation z above the bottom.
  double K(double r, double z, double t) const {
    const double pi = std::numbers::pi, k1 = j01 / R;
    const double b2 = alpha * alpha / 4 + k1 * k1, b = std::sqrt(b2);
    const double c = alpha * (soil.theta_s - soil.theta_r) / soil.Ks;
    double sum = 0.0;
    for (int k = 1; k <= 400; ++k) {
      const double l = k * pi / L, g = (b2 + l * l) / c;
      if (g * t > 40) break;
      sum += (k % 2 ? -1.0 : 1.0) * l / g * std::sin(l * z) * std::exp(-g * t);
    }
    const double D = std::sinh(b * z) / std::sinh(b * L) + 2 / (L * c) * sum;
    return dry + (1 - dry) * std::cyl_bessel_j(0.0, k1 * r) * std::exp(alpha * (L - z) / 2) * D;
  }

  std::vector<Condition> conditions() const {
    const Condition top{Boundary::head,
                        [this](double, double r) {
                          const double share = std::cyl_bessel_j(0.0, j01 * r / R);
                          return std::log(dry + (1 - dry) * share) / alpha;
                        },
                        false};
    return {top, Condition::constant(Boundary::head, h_r),
            Condition::constant(Boundary::head, h_r)};
  }

  CellsAndFaces mesh(int n) const {
    return axisymmetric_mesh(equal_edges(0.0, R, n), equal_edges(0.0, -L, 3 * n), {}, {"top"});
  }
  FlowRun run(const CellsAndFaces& m, double theta_tolerance, const std::vector<double>& t) const {
    FlowSystem flow(m, soil, table, conditions());
    return run_flow(flow, theta_tolerance, uniform_state(flow, h_r), t);
  }
  /// Largest error of exp(alpha h) in any cell; its range is 0 to 1.
  double worst_error(const CellsAndFaces& m, const FlowRecord& at) const {
    double worst = 0.0;
    for (std::size_t i = 0; i < at.u.size(); ++i) {
      const auto& c = m.drawing.centres[i];
      worst = std::max(worst, std::abs(table->at(at.u[i]).K - K(c[0], L + c[1], at.time)));
    }
    return worst;
  }
};

}  // namespace

TEST_CASE("cylinder: the series written here gives the points of the table", "[axisymmetric]") {
  const Cylinder c;
  for (const json& row : c.exact["heads"]) {
    const double h = row["h_cm"].get<double>();
    CAPTURE(row.dump());
    CHECK(c.K(row["r_cm"].get<double>() * cm, row["z_cm"].get<double>() * cm,
              row["time_d"].get<double>() * day) ==
          Approx(std::exp(c.alpha * cm * h)).epsilon(1e-8).margin(1e-12));
  }
  // the series evaluated a third time, by code of its own
  CHECK(std::log(c.K(0.0, 0.25, 0.05 * day)) / c.alpha == Approx(-0.12134018).epsilon(1e-7));
  CHECK(std::log(c.K(0.05, 0.20, 10 * day)) / c.alpha == Approx(-0.23564567).epsilon(1e-7));
}

TEST_CASE("cylinder: heads everywhere and water through the top", "[axisymmetric]") {
  const Cylinder c;
  const CellsAndFaces m = c.mesh(64);
  std::vector<double> times;
  for (const json& row : c.exact["top"]) times.push_back(row["time_d"].get<double>() * day);
  const FlowRun r = c.run(m, 1e-5, times);
  for (std::size_t i = 0; i < times.size(); ++i) {
    const json& row = c.exact["top"][i];
    CAPTURE(row.dump());
    CHECK(c.worst_error(m, r.records[i]) < 5e-4);
    const double flow = row["flow_cm3_per_d"].get<double>() * 1e-6 / day;
    const double volume = row["volume_cm3"].get<double>() * 1e-6;
    CHECK(-r.records[i].flows[0] == Approx(flow).epsilon(1e-3));
    CHECK(-r.records[i].volumes[0] == Approx(volume).epsilon(1e-3));
  }
}

// Two-point fluxes on equal cells: second order; the exact logarithmic resistance keeps it so up
// to the axis.
TEST_CASE("cylinder: order of convergence in space", "[axisymmetric][convergence]") {
  const Cylinder c;
  for (double t : {0.05 * day, 2.0 * day}) {
    std::vector<double> sizes, errors, flow_errors;
    for (int n : {8, 16, 32}) {
      const CellsAndFaces m = c.mesh(n);
      const FlowRun r = c.run(m, 2e-6, {t});
      sizes.push_back(1.0 / n);
      errors.push_back(c.worst_error(m, r.records[0]));
      for (const json& row : c.exact["top"])
        if (std::abs(row["time_d"].get<double>() * day - t) < 1.0)
          flow_errors.push_back(
              std::abs(-r.records[0].volumes[0] / (row["volume_cm3"].get<double>() * 1e-6) - 1));
    }
    CAPTURE(t, errors, flow_errors);
    CHECK(validation::measured_order(sizes, errors) > 1.7);
    CHECK(validation::measured_order(sizes, flow_errors) > 1.7);
  }
}

// The error per step is held at the tolerance by formulas of order 1 to 3.
TEST_CASE("cylinder: order of convergence in time", "[axisymmetric][convergence]") {
  const Cylinder c;
  const CellsAndFaces m = c.mesh(16);
  const std::vector<double> times{0.02 * day, 0.1 * day};
  const FlowRun reference = c.run(m, 1e-8, times);
  const std::vector<double> tolerances{1e-2, 1e-3, 1e-4, 1e-5};
  std::vector<double> steps, errors;
  for (double tolerance : tolerances) {
    const FlowRun r = c.run(m, tolerance, times);
    double worst = 0.0;
    for (std::size_t i = 0; i < times.size(); ++i)
      for (std::size_t k = 0; k < r.records[i].u.size(); ++k)
        worst = std::max(worst, std::abs(c.table->at(r.records[i].u[k]).K -
                                         c.table->at(reference.records[i].u[k]).K));
    errors.push_back(worst);
    steps.push_back(1.0 / static_cast<double>(r.statistics.steps));
  }
  CAPTURE(errors, steps);
  for (std::size_t i = 0; i + 1 < errors.size(); ++i) CHECK(errors[i + 1] < errors[i]);
  CHECK(validation::measured_order(tolerances, errors) > 0.6);
  CHECK(validation::measured_order(steps, errors) > 2.0);
}
