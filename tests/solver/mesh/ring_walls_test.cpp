#include "solver/mesh/ring_walls.hpp"

#include <catch2/catch.hpp>
#include <cmath>

#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

using Names = std::vector<std::string>;

TestSetup double_ring(double inner_insertion, double outer_insertion) {
  TestSetup s;
  s.soil = gardner_soil(5.0);
  s.initial_head = -3.0;
  s.ring = {0.15, inner_insertion, 0.003};
  s.outer_ring = models::SingleRing{0.30, outer_insertion, 0.004};
  s.pond_head = 0.05;
  s.duration = 3600.0;
  return s;
}

models::Stage held(double head, double duration) {
  models::Stage stage;
  stage.head = head, stage.duration = duration;
  return stage;
}

}  // namespace

TEST_CASE("two driven rings: two walls, three stretches of surface", "[solver][mesh]") {
  const RingWalls w = ring_walls(double_ring(0.05, 0.10));
  CHECK(w.surface == Names{"ring", "annulus", "outside"});
  REQUIRE(w.walls.size() == 2);
  CHECK(w.walls[0].radius == 0.15);
  CHECK(w.walls[0].depth == 0.05);
  CHECK(w.walls[1].radius == 0.30);
  CHECK(w.walls[1].depth == 0.10);
}

TEST_CASE("an inner ring on the surface between equal ponds divides nothing", "[solver][mesh]") {
  const RingWalls w = ring_walls(double_ring(0.0, 0.10));
  CHECK(w.surface == Names{"ring", "annulus", "outside"});
  REQUIRE(w.walls.size() == 2);
  CHECK(w.walls[0].depth == 0.0);
  CHECK_FALSE(w.walls[0].corrected);
  CHECK(w.walls[1].corrected);
}

TEST_CASE("an inner ring on the surface between unequal ponds covers a strip", "[solver][mesh]") {
  TestSetup s = double_ring(0.0, 0.0);
  s.outer_program.stages = {held(0.10, 3600.0)};
  const RingWalls w = ring_walls(s);
  CHECK(w.surface == Names{"ring", "wall", "annulus", "wall", "outside"});
  REQUIRE(w.walls.size() == 4);
  CHECK(w.walls[1].radius == 0.15 + 0.003);
  CHECK(w.walls[0].pond_inside);
  CHECK_FALSE(w.walls[1].pond_inside);
  CHECK(w.walls[3].radius == 0.30 + 0.004);
}

TEST_CASE("ponds are equal when nothing can hold their heads apart", "[solver][mesh]") {
  TestSetup s = double_ring(0.0, 0.10);
  CHECK(has_equal_ponds(s));
  s.program.stages = s.outer_program.stages = {held(0.05, 1800.0), held(0.10, 1800.0)};
  CHECK(has_equal_ponds(s));
  SECTION("another head") { s.outer_program.stages[1].head = 0.12; }
  SECTION("another time") { s.outer_program.stages[0].duration = 1200.0; }
  SECTION("another ramp") { s.outer_program.stages[1].ramp = 60.0; }
  SECTION("only one program") { s.outer_program.stages.clear(); }
  SECTION("a fall") {
    s.program.stages[1].kind = s.outer_program.stages[1].kind = models::StageKind::free_fall;
  }
  SECTION("a step down left to the soil") {
    s.program.stages[1].head = s.outer_program.stages[1].head = 0.02;
  }
  SECTION("a supply that may not keep up") { s.outer_program.supply.largest_rate = 1e-5; }
  SECTION("a time without water in one of them") { s.outer_program.empty = {{600.0, 900.0}}; }
  CHECK_FALSE(has_equal_ponds(s));
}

TEST_CASE("the wall knows what ground meets at its foot", "[solver][mesh]") {
  TestSetup s = double_ring(0.05, 0.10);
  models::Layer below;
  below.top = 0.10, below.soil = gardner_soil(2.0), below.soil.Ks = 4 * s.soil.Ks;
  below.soil.anisotropy = 9.0;
  s.layers_below = {below};
  SECTION("layers") {
    const RingWalls w = ring_walls(s);
    CHECK(w.walls[0].ground.one_isotropic_soil());
    CHECK(w.walls[1].ground.contrast == Approx(0.25));
    CHECK(w.walls[1].ground.stretch_above == 1.0);
    CHECK(w.walls[1].ground.stretch_below == 3.0);
  }
  SECTION("disturbed soil ends at the foot") {
    s.disturbed = models::DisturbedSoil{0.02, 5.0};
    CHECK(ring_walls(s).walls[0].ground.contrast == Approx(5.0));
    CHECK(ring_walls(s).walls[1].ground.contrast == Approx(1.25));
  }
  SECTION("where water runs down a gap, the wall has no tip of its own") {
    s.gap = models::WallGap{0.001};
    CHECK_FALSE(ring_walls(s).walls[0].corrected);
  }
}

TEST_CASE("rings that do not enclose each other, or have no thickness, are refused",
          "[solver][mesh]") {
  TestSetup s = double_ring(0.05, 0.05);
  s.outer_ring->radius = 0.15;
  CHECK_THROWS_AS(ring_walls(s), std::invalid_argument);
  TestSetup thin = double_ring(0.05, 0.0);
  thin.outer_ring->wall = 0.0;
  CHECK_THROWS_AS(ring_walls(thin), std::invalid_argument);
}
