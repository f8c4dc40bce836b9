#include "solver/mesh/ring_walls.hpp"

#include <algorithm>
#include <cmath>
#include <stdexcept>

#include "solver/mesh/ring_soils.hpp"

namespace ringwright::solver {
namespace {

using models::PondProgram;
using models::Stage;

std::vector<Stage> stages_of(const PondProgram& program, const TestSetup& setup) {
  if (!program.stages.empty()) return program.stages;
  Stage held;
  held.head = setup.pond_head, held.duration = setup.duration, held.ramp = 0.0;
  return {held};
}

// What two rings of different area hold alike: heads kept up by a supply without limit.
bool is_held(const std::vector<Stage>& stages) {
  for (std::size_t i = 0; i < stages.size(); ++i) {
    if (stages[i].kind != models::StageKind::constant_head) return false;
    const bool lowered = i > 0 && stages[i].head < stages[i - 1].head;
    if (lowered && stages[i].down == models::StepDown::fall) return false;
  }
  return true;
}

bool is_same(const Stage& a, const Stage& b) {
  return a.head == b.head && a.duration == b.duration && a.ramp == b.ramp && a.down == b.down;
}

bool is_same(const models::EmptySpell& a, const models::EmptySpell& b) {
  return a.from == b.from && a.to == b.to;
}

TipGround ground_at(const TestSetup& setup, const models::SingleRing& ring) {
  const double d = ring.insertion;
  TipGround g;
  g.stretch_above = g.stretch_below = stretch_at_foot(setup, ring);
  if (d <= 0.0) return g;
  const int over = layer_at(setup, d - kSameDepth), under = layer_at(setup, d + kSameDepth);
  if (over != under) {
    const models::Soil& above = layer_soil(setup, over);
    g.stretch_above = std::sqrt(above.anisotropy);
    g.contrast = above.Ks / layer_soil(setup, under).Ks;
  }
  if (setup.disturbed) g.contrast *= setup.disturbed->factor;
  return g;
}

void add_ring(RingWalls& all, const models::SingleRing& ring, const TestSetup& setup,
              const std::string& outside) {
  const double a = ring.radius, d = ring.insertion;
  const TipGround ground = ground_at(setup, ring);
  if (d > 0.0) {
    all.walls.push_back({a, d, true, !setup.gap, ground});
  } else {
    if (!(ring.wall > 0.0))
      throw std::invalid_argument("a ring on the surface needs a wall thicker than 0");
    all.walls.push_back({a, 0.0, true, true, ground});
    all.walls.push_back({a + ring.wall, 0.0, false, true, ground});
    all.surface.push_back("wall");
  }
  all.surface.push_back(outside);
}

}  // namespace

double stretch_at_foot(const TestSetup& setup, const models::SingleRing& ring) {
  return std::sqrt(layer_soil(setup, layer_at(setup, ring.insertion + kSameDepth)).anisotropy);
}

std::vector<models::SingleRing> rings_of(const TestSetup& setup) {
  std::vector<models::SingleRing> rings{setup.ring};
  if (setup.outer_ring) rings.push_back(*setup.outer_ring);
  return rings;
}

bool has_equal_ponds(const TestSetup& setup) {
  const std::vector<Stage> inner = stages_of(setup.program, setup);
  const std::vector<Stage> outer = stages_of(setup.outer_program, setup);
  const auto& dry = setup.program.empty;
  const auto& dry_outer = setup.outer_program.empty;
  const auto same_stage = [](const Stage& a, const Stage& b) { return is_same(a, b); };
  const auto same_spell = [](const models::EmptySpell& a, const models::EmptySpell& b) {
    return is_same(a, b);
  };
  const bool limited = setup.program.supply.is_limited() || setup.outer_program.supply.is_limited();
  return !limited && is_held(inner) && is_held(outer) &&
         std::equal(inner.begin(), inner.end(), outer.begin(), outer.end(), same_stage) &&
         std::equal(dry.begin(), dry.end(), dry_outer.begin(), dry_outer.end(), same_spell);
}

bool inner_ring_divides_nothing(const TestSetup& setup) {
  return setup.outer_ring && setup.ring.insertion <= 0.0 && has_equal_ponds(setup);
}

RingWalls ring_walls(const TestSetup& setup) {
  RingWalls all{{}, {"ring"}};
  if (!setup.outer_ring) {
    add_ring(all, setup.ring, setup, "outside");
    return all;
  }
  const bool strip = setup.ring.insertion <= 0.0 && !inner_ring_divides_nothing(setup);
  if (setup.outer_ring->radius <= setup.ring.radius + (strip ? setup.ring.wall : 0.0))
    throw std::invalid_argument("the outer ring must be wider than the inner one");
  if (inner_ring_divides_nothing(setup)) {
    all.walls.push_back({setup.ring.radius, 0.0, true, false, {}});
    all.surface.push_back("annulus");
  } else {
    add_ring(all, setup.ring, setup, "annulus");
  }
  add_ring(all, *setup.outer_ring, setup, "outside");
  return all;
}

}  // namespace ringwright::solver
