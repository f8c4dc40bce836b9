#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>
#include <string>

#include "cases/input/read_case.hpp"
#include "cases/simulate/question.hpp"

namespace ringwright::cases {
namespace {

Case case_of(const std::string& ground) {
  return read_case("ringwright: 1\nground:\n" + ground +
                       "tests:\n  a: { ring: 30 cm, insert: 10 cm, head: 5 cm }\n",
                   "x.yaml");
}

solver::TestSetup setup_of(const Case& what, std::size_t variant) {
  return question_of(what.tests[0], what.ground, what.ground.variants[variant], 0.01, 1).setup;
}

// Carsel & Parrish 1988, Water Resour. Res. 24:755, Table 1 and 3 by class: Ks of loam 24.96 cm/d,
// clay loam 6.24 cm/d, sandy loam 106.1 cm/d.
double cm_per_day(double value) { return value * 0.01 / 86400; }

}  // namespace

TEST_CASE("layers go together by published table", "[layers]") {
  const Case what = case_of("  texture: loam, moist\n  layers: clay loam, wet from 50 cm down\n");
  REQUIRE(what.ground.variants.size() == 2);
  REQUIRE(what.ground.layers_below.size() == 1);
  const GroundLayer& layer = what.ground.layers_below[0];
  REQUIRE(layer.variants.size() == 2);
  for (std::size_t i = 0; i < 2; ++i)
    CHECK(layer.variants[i].source == what.ground.variants[i].source);
  CHECK(layer.top == Approx(0.5));
  const auto setup = setup_of(what, 0);
  CHECK(setup.soil.Ks == Approx(cm_per_day(24.96)).epsilon(2e-3));
  REQUIRE(setup.layers_below.size() == 1);
  CHECK(setup.layers_below[0].soil.Ks == Approx(cm_per_day(6.24)).epsilon(2e-3));
  CHECK(setup.initial_head == Approx(-3.0));
  CHECK(setup.layers_below[0].initial_head == Approx(-0.6));
  CHECK(setup.layers_below[0].name == "clay loam");
  CHECK(setup_of(what, 1).layers_below[0].soil.Ks != setup.layers_below[0].soil.Ks);
}

TEST_CASE("one known soil goes with all tables of the other layers", "[layers]") {
  const Case what = case_of(
      "  parameters: { theta_r: 0.05, theta_s: 0.4, alpha: 3 1/m, n: 1.6, Ks: 2 cm/h }\n"
      "  layers: clay loam from 50 cm\n");
  REQUIRE(what.ground.variants.size() == 2);
  CHECK(what.ground.variants[0].soil.Ks == what.ground.variants[1].soil.Ks);
  CHECK(what.ground.variants[0].source != what.ground.variants[1].source);
}

TEST_CASE("layers above the level of the test are dug away", "[layers]") {
  const std::string ground =
      "  published: Carsel & Parrish 1988\n  texture: loam\n  layers:\n"
      "    - { texture: sandy loam, from: 30 cm, published: Carsel & Parrish 1988 }\n"
      "    - { texture: clay loam, from: 80 cm, published: Carsel & Parrish 1988 }\n";
  const auto at = [&](const std::string& level) {
    return setup_of(case_of("  test level: " + level + "\n" + ground), 0);
  };
  const auto above = at("20 cm below ground");
  CHECK(above.soil.Ks == Approx(cm_per_day(24.96)).epsilon(2e-3));
  REQUIRE(above.layers_below.size() == 2);
  CHECK(above.layers_below[0].top == Approx(0.1));
  const auto within = at("60 cm");
  CHECK(within.soil.Ks == Approx(cm_per_day(106.1)).epsilon(2e-3));
  REQUIRE(within.layers_below.size() == 1);
  CHECK(within.layers_below[0].top == Approx(0.2));
  // On a boundary the lower layer is what the ring stands on.
  const auto on = at("80 cm");
  CHECK(on.soil.Ks == Approx(cm_per_day(6.24)).epsilon(2e-3));
  CHECK(on.layers_below.empty());
}

TEST_CASE("the list alone may hold all layers", "[layers]") {
  const Case what = case_of(
      "  layers:\n    - { name: crust, texture: silt loam }\n    - { texture: loam, from: 2 cm "
      "}\n");
  CHECK(what.ground.variants[0].label == "crust");
  CHECK(what.ground.layers_below[0].top == Approx(0.02));
}

TEST_CASE("a water table counts from the ground and the ground is hydrostatic to it", "[layers]") {
  const Case what = case_of(
      "  test level: 50 cm\n  texture: loam\n  layers: sandy loam from 1 m\n  water table: 2 m\n");
  const auto setup = setup_of(what, 0);
  CHECK(setup.water_table.value() == Approx(1.5));
  CHECK(setup.initial_head == Approx(-1.5));
  CHECK(setup.layers_below[0].initial_head == Approx(-1.0));
}

TEST_CASE("ground at rest over a table has that table", "[layers]") {
  const Case what =
      case_of("  test level: 50 cm\n  texture: loam\n  moisture: hydrostatic to 3 m\n");
  const auto setup = setup_of(what, 0);
  CHECK(setup.water_table.value() == Approx(2.5));
}

TEST_CASE("what driving the ring does, and anisotropy", "[layers]") {
  const Case what = case_of(
      "  texture: loam, moist\n  Kr over Kz: 3\n  disturbed: { width: 1 cm, Ks x: 0.3 }\n"
      "  wall gap: 0.05 mm\n  wet density: 1.9 g/cm3\n");
  const auto setup = setup_of(what, 0);
  CHECK(setup.soil.anisotropy == Approx(3));
  CHECK(setup.disturbed->width == Approx(0.01));
  CHECK(setup.disturbed->factor == Approx(0.3));
  CHECK(setup.gap->width == Approx(5e-5));
  CHECK(what.ground.wet_density.value() == Approx(1900));
}

TEST_CASE("the true Kfs may be that of a named layer", "[layers]") {
  const Case what = case_of(
      "  texture: loam, moist\n  layers: clay loam, moist from 50 cm\n  true Kfs of: Clay Loam\n");
  CHECK(what.ground.truth_layer == "clay loam");
}

TEST_CASE("a soil of two pore systems", "[layers]") {
  const Case what = case_of(
      "  parameters: { curve: Durner, theta_r: 0.05, theta_s: 0.45, alpha: 0.8 1/m, n: 1.4,\n"
      "                alpha 2: 25 1/m, n 2: 2.5, weight 2: 0.2, Ks: 2 cm/h }\n");
  const auto& curves = *what.ground.variants.at(0).soil.curves;
  // Durner 1994, Water Resour. Res. 30:211: the weighted sum of both, here at h = -1 m; over its
  // value at the minimum capillary height of -2 cm.
  const auto system = [](double alpha, double n, double h) {
    return std::pow(1 + std::pow(-alpha * h, n), -(1 - 1 / n));
  };
  const auto both = [&](double h) { return 0.8 * system(0.8, 1.4, h) + 0.2 * system(25, 2.5, h); };
  CHECK(curves.saturation(-1.0) == Approx(both(-1.0) / both(-0.02)).epsilon(1e-9));
}

}  // namespace ringwright::cases
