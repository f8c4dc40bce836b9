/// Rings on and through layers, against meshes that resolve them much finer.

#include <catch2/catch.hpp>
#include <cmath>

#include "solver/ground_materials.hpp"
#include "solver/resolution.hpp"
#include "solver/steady_ring.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

models::Layer layer(double top, const models::Soil& soil) {
  models::Layer l;
  l.top = top, l.soil = soil, l.initial_head = -3.0;
  return l;
}

TestSetup ring(const models::Soil& top, std::vector<models::Layer> below, double d = 0.05) {
  TestSetup s;
  s.soil = top;
  s.initial_head = -3.0;
  s.ring = {0.15, d, 0.003};
  s.pond_head = 0.10;
  s.layers_below = std::move(below);
  return s;
}

models::Soil slower(models::Soil soil, double times) {
  soil.Ks /= times;
  return soil;
}

// Flow on the mesh for 1 % over that on cells an eighth as wide and high.
double on_rough_over_fine(const TestSetup& s) {
  const std::vector<Material> materials = ground_materials(s);
  const double lambda = materials.front().table->capillary_length();
  const Resolution rough = resolution_for(s, 0.01, lambda, 600.0);
  Resolution fine = rough.scaled(0.25);
  fine.splits = 1;
  const SteadyHeads heads{.ring = s.pond_head};
  return steady_flow(s, heads, rough, materials).ring_flow /
         steady_flow(s, heads, fine, materials).ring_flow;
}

}  // namespace

TEST_CASE("a ring through a thin crust, 20 times slower than the loam below", "[layers][steady]") {
  const models::Soil loam = class_soil("loam");
  for (double thickness : {0.002, 0.005, 0.02})
    for (double d : {0.0, 0.05}) {
      const double ratio =
          on_rough_over_fine(ring(slower(loam, 20.0), {layer(thickness, loam)}, d));
      CAPTURE(thickness, d, ratio);
      CHECK(std::abs(ratio - 1) < 0.01);
    }
}

TEST_CASE("layers at, just above and below the foot of the wall", "[layers][steady]") {
  const models::Soil loam = class_soil("loam"), sand = class_soil("sand"),
                     sandy_loam = class_soil("sandy loam"), clay = class_soil("clay");
  const TestSetup setups[] = {ring(sand, {layer(0.05, loam)}),
                              ring(sand, {layer(0.045, loam)}),
                              ring(sand, {layer(0.06, loam)}),
                              ring(sandy_loam, {layer(0.30, clay)}),
                              ring(loam, {layer(0.05, slower(loam, 10.0))}),
                              ring(loam, {layer(0.05, slower(loam, 0.1))})};
  for (const TestSetup& s : setups) {
    const double ratio = on_rough_over_fine(s);
    CAPTURE(s.soil.curves->describe(), s.soil.Ks, s.layers_below[0].top, ratio);
    CHECK(std::abs(ratio - 1) < 0.01);
  }
}
