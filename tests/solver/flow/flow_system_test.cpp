#include "solver/flow/flow_system.hpp"

#include <Eigen/Dense>
#include <catch2/catch.hpp>
#include <cmath>
#include <numeric>
#include <random>

#include "solver/mesh/axisymmetric.hpp"
#include "tests/solver/flow_run.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

CellsAndFaces small_ring() {
  return axisymmetric_mesh({0.0, 0.04, 0.07, 0.10, 0.13, 0.20}, {0.0, -0.02, -0.05, -0.08, -0.2},
                           {{0.10, 0.05, true}}, {"ring", "outside"});
}

Condition wavy_head(double mean) {
  return {Boundary::head,
          [mean](double t, double x) { return mean + 0.1 * x + 0.02 * std::sin(1e-3 * t); }, true};
}

/// One set of conditions after the other, so that every kind is met on the ring's patches.
std::vector<std::vector<Condition>> condition_sets() {
  const auto fixed = [](Boundary kind, double value) { return Condition::constant(kind, value); };
  const Condition closed{}, seepage{Boundary::seepage, {}, false},
      drainage{Boundary::free_drainage, {}, false};
  return {{fixed(Boundary::head, 0.1), seepage, drainage, closed},
          {wavy_head(0.05), seepage, fixed(Boundary::head, -1.5), fixed(Boundary::flux, 1e-7)},
          {wavy_head(-0.4), fixed(Boundary::flux, 2e-6), seepage, wavy_head(-2.0)},
          {fixed(Boundary::flux, -3e-7), closed, closed, fixed(Boundary::head, 0.02)}};
}

enum class Wetness { dry, wet, saturated, mixed };

std::vector<double> random_state(const CurveTable& table, int cells, Wetness wetness,
                                 std::mt19937& generator) {
  std::uniform_real_distribution<double> share(0.0, 1.0);
  const auto head = [&]() -> double {
    switch (wetness) {
      case Wetness::dry:
        return -std::pow(10.0, 2 * share(generator));  // -1 to -100 m
      case Wetness::wet:
        return -0.03 - 0.5 * share(generator);
      case Wetness::saturated:
        return 0.01 + 0.3 * share(generator);
      case Wetness::mixed:
        break;
    }
    return share(generator) < 0.5 ? 0.01 + 0.2 * share(generator)
                                  : -std::pow(10.0, -1.5 + 3 * share(generator));
  };
  std::vector<double> u;
  for (int i = 0; i < cells; ++i) u.push_back(table.u_of_head(head()));
  return u;
}

Eigen::MatrixXd jacobian(FlowSystem& flow, std::span<const double> u) {
  flow.set_state(u);
  std::vector<double> values(flow.pattern().rows.size(), 0.0);
  flow.add_jacobian(values);
  Eigen::MatrixXd J = Eigen::MatrixXd::Zero(flow.cells(), flow.cells());
  const SparsePattern& p = flow.pattern();
  for (int j = 0; j < flow.cells(); ++j)
    for (int k = p.column_starts[static_cast<std::size_t>(j)];
         k < p.column_starts[static_cast<std::size_t>(j) + 1]; ++k)
      J(p.rows[static_cast<std::size_t>(k)], j) = values[static_cast<std::size_t>(k)];
  return J;
}

/// Central differences, and what rounding may make of each of their columns.
struct Differences {
  Eigen::MatrixXd matrix;
  Eigen::VectorXd rounding;
};

Differences differences(FlowSystem& flow, std::vector<double> u) {
  const auto n = u.size();
  Differences d{Eigen::MatrixXd(flow.cells(), flow.cells()), Eigen::VectorXd(flow.cells())};
  std::vector<double> up(n), down(n);
  for (std::size_t j = 0; j < n; ++j) {
    const double old = u[j], e = 1e-5 * std::min(1.0, old - flow.table(0).driest());
    u[j] = old + e;
    flow.set_state(u);
    flow.net_outflow(up);
    u[j] = old - e;
    flow.set_state(u);
    flow.net_outflow(down);
    u[j] = old;
    double largest = 0.0;
    for (std::size_t i = 0; i < n; ++i) {
      d.matrix(static_cast<int>(i), static_cast<int>(j)) = (up[i] - down[i]) / (2 * e);
      largest = std::max(largest, std::abs(up[i]));
    }
    d.rounding(static_cast<int>(j)) = 1e-14 * largest / e;
  }
  return d;
}

}  // namespace

TEST_CASE("Jacobian of the flow against differences, every boundary kind, dry to saturated",
          "[solver][flow]") {
  std::mt19937 generator(4);
  for (const char* texture : {"sand", "loam", "clay"}) {
    const models::Soil soil = class_soil(texture);
    const auto table = std::make_shared<CurveTable>(soil.curves);
    for (bool gravity : {true, false}) {
      const CellsAndFaces mesh = gravity ? small_ring() : without_gravity(small_ring());
      for (const auto& conditions : condition_sets()) {
        FlowSystem flow(mesh, soil, table, conditions);
        flow.set_time(700.0);
        for (Wetness w : {Wetness::dry, Wetness::wet, Wetness::saturated, Wetness::mixed}) {
          const std::vector<double> u = random_state(*table, flow.cells(), w, generator);
          const Eigen::MatrixXd J = jacobian(flow, u);
          const Differences d = differences(flow, u);
          CAPTURE(texture, gravity, static_cast<int>(w));
          double worst = 0.0;  // each column against its own largest entry
          for (int j = 0; j < J.cols(); ++j) {
            const double size = d.matrix.col(j).cwiseAbs().maxCoeff() + 1e-300;
            const double wrong = (J.col(j) - d.matrix.col(j)).cwiseAbs().maxCoeff();
            worst = std::max(worst, (wrong - d.rounding(j)) / size);
          }
          CHECK(worst < 1e-4);
        }
      }
    }
  }
}

TEST_CASE("what leaves the cells leaves through the patches", "[solver][flow]") {
  std::mt19937 generator(8);
  const models::Soil soil = class_soil("silt loam");
  const auto table = std::make_shared<CurveTable>(soil.curves);
  for (const auto& conditions : condition_sets()) {
    FlowSystem flow(small_ring(), soil, table, conditions);
    const std::vector<double> u = random_state(*table, flow.cells(), Wetness::mixed, generator);
    flow.set_state(u);
    std::vector<double> out(u.size());
    flow.net_outflow(out);
    double cells = 0.0, patches = 0.0, size = 0.0;
    for (double q : out) cells += q, size += std::abs(q);
    for (double q : flow.patch_outflow()) patches += q;
    CHECK(std::abs(cells - patches) < 1e-13 * size);
  }
}

TEST_CASE("boundary kinds: sign and size of the flow", "[solver][flow]") {
  const models::Soil soil = gardner_soil(5.0);
  const auto table = std::make_shared<CurveTable>(soil.curves);
  const CellsAndFaces mesh = column_mesh({0.0, -0.1, -0.2}, 2.0);
  const auto outflow = [&](const Condition& top, const Condition& bottom, double head) {
    FlowSystem flow(mesh, soil, table, {top, bottom});
    const std::vector<double> u = uniform_state(flow, head);
    flow.set_state(u);
    std::vector<double> out(2);
    flow.net_outflow(out);
    return std::vector<double>(flow.patch_outflow().begin(), flow.patch_outflow().end());
  };
  const Condition closed{}, seepage{Boundary::seepage, {}, false},
      drainage{Boundary::free_drainage, {}, false};

  CHECK(outflow(closed, closed, -1.0) == std::vector<double>{0.0, 0.0});
  CHECK(outflow(Condition::constant(Boundary::flux, 3e-6), closed, -1.0)[0] == Approx(-6e-6));
  // unit gradient: K times area
  CHECK(outflow(closed, drainage, -0.2)[1] == Approx(1e-5 * std::exp(-1.0) * 2.0).epsilon(1e-5));
  // saturated: Darcy over half a cell, 0.05 m; head 0.3 on the surface, 0.1 in the cell
  const double fall = (0.3 - 0.1) + 0.05;
  CHECK(outflow(Condition::constant(Boundary::head, 0.3), closed, 0.1)[0] ==
        Approx(-1e-5 * 2.0 * fall / 0.05).epsilon(1e-9));
  // open to the air: closed to suction, open to pressure, never a source
  CHECK(outflow(closed, seepage, -0.5)[1] == 0.0);
  CHECK(outflow(closed, seepage, 0.1)[1] == Approx(1e-5 * 2.0 * (0.1 + 0.05) / 0.05).epsilon(1e-9));
  CHECK(outflow(seepage, closed, 0.02)[0] == 0.0);  // the cell's head at the surface is below 0
  CHECK(outflow(seepage, closed, 0.2)[0] > 0.0);
}

TEST_CASE("a head may vary along the patch and in time", "[solver][flow]") {
  const models::Soil soil = gardner_soil(5.0);
  const auto table = std::make_shared<CurveTable>(soil.curves);
  const CellsAndFaces mesh = plane_mesh({0.0, 0.1, 0.2, 0.3}, {0.0, -0.1});
  const Condition sloping{Boundary::head, [](double t, double x) { return -x + 1e-3 * t; }, true};
  FlowSystem flow(mesh, soil, table, {sloping, {}, {}, {}});
  const std::vector<double> u = uniform_state(flow, -0.4);
  std::vector<double> out(3);
  const auto expected = [&](double t, double x) {
    const auto Phi = [](double h) { return h < 0 ? std::exp(5 * h) / 5 : 0.2 + h; };
    const auto K = [](double h) { return h < 0 ? std::exp(5 * h) : 1.0; };
    const double top = -x + 1e-3 * t, p = -0.05 * 5.0 / 2;  // rise over twice the capillary length
    const double w = 0.5 * (1 + 1 / std::tanh(p) - 1 / p);
    return 1e-5 * (0.1 / 0.05) * (Phi(-0.4) - Phi(top) - 0.05 * (w * K(-0.4) + (1 - w) * K(top)));
  };
  for (double t : {0.0, 100.0, 350.0}) {
    flow.set_time(t);
    flow.set_state(u);
    flow.net_outflow(out);
    for (int i = 0; i < 3; ++i)
      CHECK(out[static_cast<std::size_t>(i)] == Approx(expected(t, 0.05 + 0.1 * i)).epsilon(1e-5));
  }
}

// Steady one-dimensional flow of a Gardner soil: K + lambda dK/dz = q has the solution
// K = q + (K_0 - q) exp(-z/lambda), z up (Gardner 1958, Soil Sci. 85:228). The exponential weight
// makes the face flow exact on it at any cell height.
TEST_CASE("gravity weight: steady Gardner flow is exact on coarse cells", "[solver][flow]") {
  const models::Soil soil = gardner_soil(8.0);
  const auto table = std::make_shared<CurveTable>(soil.curves);
  const CellsAndFaces mesh = column_mesh(equal_edges(0.0, -3.0, 6));  // p = 2
  FlowSystem flow(mesh, soil, table, {{}, {}});
  const double q = 0.3, K_bottom = 0.8;
  std::vector<double> u, out(6);
  for (double z : mesh.elevation)
    u.push_back(table->u_of_saturation(q + (K_bottom - q) * std::exp(-8.0 * (z + 3.0))));
  flow.set_state(u);
  flow.net_outflow(out);
  // closed ends: the flow q Ks leaves the top cell and gathers in the lowest
  CHECK(out.front() == Approx(q * soil.Ks).epsilon(1e-5));
  CHECK(out.back() == Approx(-q * soil.Ks).epsilon(1e-5));
  for (std::size_t i = 1; i < 5; ++i) CHECK(std::abs(out[i]) < 1e-5 * q * soil.Ks);
}

TEST_CASE("without gravity a uniform head rests, with gravity hydrostatic rests",
          "[solver][flow]") {
  const models::Soil soil = class_soil("loam");
  const auto table = std::make_shared<CurveTable>(soil.curves);
  std::vector<double> out;
  {
    FlowSystem flow(without_gravity(small_ring()), soil, table, std::vector<Condition>(4));
    out.resize(static_cast<std::size_t>(flow.cells()));
    flow.set_state(uniform_state(flow, -0.7));
    flow.net_outflow(out);
    for (double q : out) CHECK(q == 0.0);
  }
  const CellsAndFaces mesh = small_ring();
  FlowSystem flow(mesh, soil, table, std::vector<Condition>(4));
  std::vector<double> u;
  for (double z : mesh.elevation) u.push_back(table->u_of_head(0.5 - z));  // saturated
  flow.set_state(u);
  flow.net_outflow(out);
  for (double q : out) CHECK(std::abs(q) < 1e-15 * soil.Ks);
}

TEST_CASE("storage: fillable part of theta and specific storage above zero head",
          "[solver][flow]") {
  models::Soil soil = gardner_soil(5.0);
  soil.specific_storage = 1e-3;
  FlowSystem flow(column_mesh({0.0, -0.1, -0.2}), soil, std::make_shared<CurveTable>(soil.curves),
                  {{}, {}});
  flow.set_state(std::vector<double>{flow.table(0).u_of_head(-0.2), 0.5});
  CHECK(flow.storage(0) == Approx(0.35 * std::exp(-1.0)).epsilon(1e-6));
  CHECK(flow.storage(1) == Approx(0.35 + 5e-4).epsilon(1e-12));
  CHECK(flow.storage_slope(1) == Approx(1e-3));
  CHECK(flow.fillable(0) == Approx(0.35));
}

TEST_CASE("one condition per patch is asked for", "[solver][flow]") {
  const models::Soil soil = gardner_soil(5.0);
  const auto table = std::make_shared<CurveTable>(soil.curves);
  CHECK_THROWS_AS(FlowSystem(small_ring(), soil, table, {{}, {}}), std::invalid_argument);
}
