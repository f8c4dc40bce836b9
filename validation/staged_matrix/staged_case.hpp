#pragma once
/// Random tests of every kind, the same on every machine and in every order.

#include <array>
#include <numbers>

#include "validation/random_matrix/random_case.hpp"

namespace ringwright::validation {

/// What is done with the water.
enum class Doing {
  steps,        ///< two to four heads, up and down, by waiting or bailing
  falls,        ///< free falls, some filled up at a threshold, some to the bare ground
  weak_supply,  ///< a supply between a tenth and three times what the soil drinks
  reservoir,    ///< a reservoir that runs dry: the test goes on, or another is brought
  double_ring   ///< two rings, the outer one empty for a while in a third of the cases
};
constexpr int kDoings = 5;

struct StagedCase {
  std::string name;
  Doing doing = Doing::steps;
  solver::TestSetup setup;  ///< sampled at twentieths of its duration
};

namespace staged {

inline double rate_guess(const solver::TestSetup& s, double head) {
  // one-head formula (Reynolds & Elrick 1990), capillary length 10 cm
  const double a = s.ring.radius, d = s.ring.insertion;
  const double area = std::numbers::pi * a * a;
  return area * s.soil.Ks * ((head + 0.1) / (0.993 * d + 0.578 * a) + 1.0);
}

inline models::StepDown down(Draws& draw) {
  return draw.chance(0.5) ? models::StepDown::fall : models::StepDown::bail;
}

inline void add_stages(Draws& draw, solver::TestSetup& s, models::StageKind kind, int count) {
  double head = 0.0;
  for (int k = 0; k < count; ++k) {
    models::Stage stage;
    stage.kind = kind;
    do stage.head = draw.uniform(0.01, 0.40);
    while (std::abs(stage.head - head) < 0.01);
    head = stage.head;
    stage.duration = s.duration / count;
    stage.ramp = draw.chance(0.2) ? 60.0 : 5.0;
    stage.down = down(draw);
    if (kind == models::StageKind::free_fall && draw.chance(0.5))
      stage.refill_below = draw.uniform(0.3, 0.9) * head;
    s.program.stages.push_back(stage);
  }
}

inline void add_second_layer(Draws& draw, solver::TestSetup& s,
                             std::span<const models::PublishedSoil> rows) {
  models::Layer below;
  below.top = draw.uniform(0.03, 0.6);
  below.soil = models::make_soil(rows[draw.below(rows.size())]);
  below.initial_head = s.initial_head;
  s.layers_below.push_back(below);
}

}  // namespace staged

/// Case `number` of the series: sand, loam, silt and clay of every published table by turns;
/// suction 30 to 3000 cm, radius 5 to 30 cm, insertion 1 to 15 cm; a second layer in a fifth of
/// the cases; Ks t between 1 and 20 cm, at most 100 h.
inline StagedCase staged_case(std::uint64_t number) {
  using namespace staged;
  static const std::vector<models::PublishedSoil> rows = [] {
    std::vector<models::PublishedSoil> some;
    for (const char* texture : {"sand", "loam", "silt", "clay"})
      for (const models::PublishedSoil& row : models::published_soils_of(texture))
        some.push_back(row);
    return some;
  }();
  Draws draw(77000 + number);
  StagedCase c;
  c.doing = static_cast<Doing>(number % kDoings);
  solver::TestSetup& s = c.setup;
  const models::PublishedSoil& row = rows[(number / kDoings) % rows.size()];
  s.soil = models::make_soil(row);
  s.initial_head = -draw.log_uniform(0.3, 30.0);
  s.ring = {draw.log_uniform(0.05, 0.30), draw.uniform(0.01, 0.15)};
  s.duration = std::min(draw.log_uniform(0.01, 0.20) / s.soil.Ks, 100 * 3600.0);
  for (int k = 1; k <= 20; ++k) s.times.push_back(k * s.duration / 20);
  const int stages = 2 + static_cast<int>(draw.below(3));
  switch (c.doing) {
    case Doing::steps:
      add_stages(draw, s, models::StageKind::constant_head, stages);
      break;
    case Doing::falls:
      add_stages(draw, s, models::StageKind::free_fall, stages);
      break;
    case Doing::weak_supply:
      add_stages(draw, s, models::StageKind::constant_head, 2);
      s.program.supply.largest_rate =
          draw.log_uniform(0.1, 3.0) * rate_guess(s, s.program.stages[0].head);
      break;
    case Doing::reservoir: {
      add_stages(draw, s, models::StageKind::constant_head, 2);
      const double area = std::numbers::pi * s.ring.radius * s.ring.radius;
      s.program.supply.reservoir =
          area * s.program.stages[0].head +
          draw.uniform(0.2, 0.8) * s.duration * rate_guess(s, s.program.stages[0].head);
      s.program.supply.when_empty =
          draw.chance(0.5) ? models::WhenEmpty::go_on : models::WhenEmpty::refill;
      s.program.supply.refill_time = 0.05 * s.duration;
      break;
    }
    case Doing::double_ring:
      add_stages(draw, s, models::StageKind::constant_head, draw.chance(0.5) ? 1 : 2);
      s.outer_ring =
          models::SingleRing{s.ring.radius * draw.uniform(1.3, 2.5), draw.uniform(0.01, 0.15)};
      s.outer_program = s.program;
      if (draw.chance(0.33)) s.outer_program.empty = {{0.3 * s.duration, 0.45 * s.duration}};
      break;
  }
  if (draw.chance(0.2)) add_second_layer(draw, s, rows);
  const auto text = [](double x) { return std::to_string(x); };
  c.name = "case " + std::to_string(number) + ": " + std::string(row.texture) + ", " +
           std::string(row.source) + ", doing " + std::to_string(static_cast<int>(c.doing)) +
           ", h0 " + text(s.initial_head) + " m, a " + text(s.ring.radius) + " m, d " +
           text(s.ring.insertion) + " m, " + text(s.duration / 3600) + " h" +
           (s.layers_below.empty() ? "" : ", second layer at " + text(s.layers_below[0].top));
  return c;
}

}  // namespace ringwright::validation
