/// Steady flow down through layers to a water table, against the closed form
///
///   z = integral of dh / (q / K(h) - 1),
///
/// z up from the table, q the flux downwards (steady Darcy flow, textbook; the case of several
/// soils as in Vanderborght et al. 2005, Vadose Zone J. 4:206, whose sand, loam and clay these
/// are). The head is continuous where one soil begins, K is not.

#include <catch2/catch.hpp>
#include <cmath>

#include "models/soil/van_genuchten.hpp"
#include "solver/flow/flow_system.hpp"
#include "solver/flow/steady_newton.hpp"
#include "solver/mesh/axisymmetric.hpp"
#include "tests/solver/flow_run.hpp"
#include "validation/order.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

constexpr double cm = 0.01, day = 86400.0;

// Vanderborght et al. 2005: theta_r, theta_s, alpha [1/cm], n, Ks [cm/d].
models::Soil soil_of(double theta_r, double theta_s, double alpha, double n, double Ks) {
  return {std::make_shared<models::VanGenuchten>(alpha / cm, n), theta_r, theta_s, Ks * cm / day};
}
models::Soil sand() { return soil_of(0.045, 0.43, 0.15, 3.0, 1000.0); }
models::Soil loam() { return soil_of(0.08, 0.43, 0.04, 1.6, 50.0); }
models::Soil clay() { return soil_of(0.1, 0.4, 0.01, 1.1, 10.0); }

/// Two layers over a water table, equally thick.
struct Column {
  models::Soil upper, lower;
  double flux = 0.0;       // downwards [m/s]
  double thickness = 0.5;  // of either [m]

  double height() const { return 2 * thickness; }
  const models::Soil& soil_at(double z) const { return z < thickness ? lower : upper; }

  /// Heads at heights [m] above the table, ascending, by steps of the classical fourth-order
  /// Runge-Kutta method that end on the border of the layers; h = 0 at the table.
  std::vector<double> exact(const std::vector<double>& heights) const {
    std::vector<double> heads;
    double z = 0.0, h = 0.0;
    for (double target : heights) {
      if (z < thickness && target > thickness) h = advance(h, z, thickness), z = thickness;
      h = advance(h, z, target), z = target;
      heads.push_back(h);
    }
    return heads;
  }

  double advance(double h, double from, double to) const {
    const models::Soil& soil = soil_at(0.5 * (from + to));
    const auto slope = [&](double at) { return flux / soil.conductivity(at) - 1.0; };
    const int n = 1 + static_cast<int>((to - from) / 2e-5);
    const double step = (to - from) / n;
    for (int i = 0; i < n; ++i) {
      const double k1 = slope(h), k2 = slope(h + step / 2 * k1), k3 = slope(h + step / 2 * k2),
                   k4 = slope(h + step * k3);
      h += step / 6 * (k1 + 2 * k2 + 2 * k3 + k4);
    }
    return h;
  }

  /// Largest error of the head in any cell of a column of n equal cells [m].
  double worst_error(int n) const {
    CellsAndFaces mesh = column_mesh(equal_edges(0.0, -height(), n));
    for (std::size_t i = 0; i < mesh.soil.size(); ++i)
      mesh.soil[i] = mesh.elevation[i] > -thickness ? 0 : 1;
    const std::vector<Material> materials{{upper, std::make_shared<CurveTable>(upper.curves)},
                                          {lower, std::make_shared<CurveTable>(lower.curves)}};
    FlowSystem flow(
        mesh, materials,
        {Condition::constant(Boundary::flux, flux), Condition::constant(Boundary::head, 0.0)});
    std::vector<double> Phi, heights;
    for (std::size_t i = 0; i < mesh.soil.size(); ++i)
      Phi.push_back(materials[static_cast<std::size_t>(mesh.soil[i])].table->potential_of_head(
          -0.5 * (mesh.elevation[i] + height()) - 0.01));
    REQUIRE(solve_steady(flow, Phi).converged);
    for (std::size_t i = mesh.soil.size(); i-- > 0;)
      heights.push_back(mesh.elevation[i] + height());
    const std::vector<double> heads = exact(heights);
    double worst = 0.0;
    for (std::size_t i = 0; i < heads.size(); ++i) {
      const std::size_t cell = heads.size() - 1 - i;
      const CurveTable& table = *materials[static_cast<std::size_t>(mesh.soil[cell])].table;
      const double found = table.head_of_u(table.u_of_potential(Phi[cell]));
      worst = std::max(worst, std::abs(found - heads[i]));
    }
    return worst;
  }
};

}  // namespace

// Second order on equal cells. Where a soil with n < 2 ends at the table, K falls from Ks as
// |alpha h|^(n - 1), its slope there is infinite, and the order is that of the trapezium rule for
// such a function, 1 + (n - 1) (textbook): 1.6 for the loam under the sand.
TEST_CASE("layered column: heads of the closed form and the order of the method",
          "[layers][convergence]") {
  struct Case {
    Column column;
    double order;
  };
  const double per_day = cm / day;
  const Case cases[] = {{{loam(), sand(), 0.5 * per_day}, 2.0},
                        {{sand(), loam(), 0.5 * per_day}, 1.6},
                        {{clay(), sand(), 0.1 * per_day}, 2.0},
                        {{loam(), sand(), -0.1 * per_day, 0.1}, 2.0},  // evaporation
                        {{sand(), loam(), 20 * per_day}, 2.0}};
  for (const auto& [column, order] : cases) {
    std::vector<double> sizes, errors;
    for (int n : {50, 100, 200, 400}) {
      sizes.push_back(column.height() / n);
      errors.push_back(column.worst_error(n));
    }
    CAPTURE(column.upper.curves->describe(), column.lower.curves->describe(), column.flux / per_day,
            errors, validation::measured_order(sizes, errors));
    CHECK(errors.back() < 1e-4);  // m
    CHECK(validation::measured_order(sizes, errors) > order - 0.15);
  }
}
