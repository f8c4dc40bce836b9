#include "cases/simulate/question.hpp"

#include <algorithm>
#include <cstdint>

#include "cases/simulate/pond_programs.hpp"
#include "models/water/viscosity.hpp"

namespace ringwright::cases {
namespace {

models::Soil at_temperature(models::Soil soil, double viscosity_ratio) {
  soil.Ks /= viscosity_ratio;
  return soil;
}

// A hydrostatic state is that of the whole ground; a layer's own is of no use beside it.
double initial_head_of(const GroundLayer& layer, const models::Soil& soil) {
  if (layer.moisture.hydrostatic_to)
    return std::min(-1e-6, layer.top - *layer.moisture.hydrostatic_to);
  return initial_head(layer.moisture, soil);
}

void add_ground(const Ground& ground, std::size_t variant, double viscosity_ratio,
                solver::TestSetup& setup) {
  for (const GroundLayer& layer : ground.layers_below) {
    const models::Soil& soil = layer.variants[variant].soil;
    setup.layers_below.push_back({layer.top, at_temperature(soil, viscosity_ratio),
                                  initial_head_of(layer, soil), layer.name});
  }
  // ground at rest over a table has that table: it stays where it is
  setup.water_table = ground.water_table ? ground.water_table : ground.moisture.hydrostatic_to;
  setup.disturbed = ground.disturbed;
  setup.gap = ground.gap;
}

// Of the layer that is named; without one the answer looks where the foot of the wall is.
std::optional<double> true_Kfs(const Ground& ground, std::size_t variant, double viscosity_ratio) {
  if (ground.truth_layer.empty()) return std::nullopt;
  if (ground.variants[variant].label == ground.truth_layer)
    return ground.variants[variant].soil.Ks / viscosity_ratio;
  for (const GroundLayer& layer : ground.layers_below) {
    if (layer.name == ground.truth_layer) return layer.variants[variant].soil.Ks / viscosity_ratio;
  }
  return std::nullopt;
}

models::Gauge gauge_of(const Test& test) {
  models::Gauge gauge;
  gauge.volume_division = test.reader.volume_division;
  gauge.random_error = test.reader.random_error;
  gauge.head_division = test.ruler;
  gauge.head_tolerance = test.head_kept;
  gauge.seed = static_cast<std::uint64_t>(test.reader.seed);
  return gauge;
}

// The rule that governs comes first; without one the test ends at its time, counted after the soak.
std::vector<models::StopRule> rules_of(const Test& test) {
  std::vector<models::StopRule> rules;
  if (test.rule) rules.push_back(*test.rule);
  if (test.also_judge.empty()) return rules;
  if (!test.rule) {
    models::StopRule end;
    end.kind = models::StopKind::after_time;
    end.time = test.protocol.longest;
    for (const models::Stage& stage : test.program.stages)
      if (stage.soak) end.time -= stage.duration;
    rules.push_back(end);
  }
  rules.insert(rules.end(), test.also_judge.begin(), test.also_judge.end());
  return rules;
}

postprocess::Circumstances circumstances_of(const Test& test, const Ground& ground) {
  postprocess::Circumstances circumstances;
  circumstances.lid = test.lid;
  circumstances.liner = ground.liner;
  circumstances.bulk_density = ground.wet_density;
  circumstances.sealed_volume = test.sealed_volume;
  circumstances.water_temperature = ground.water_temperature;
  circumstances.ballast_factor = test.ballast_factor;
  return circumstances;
}

}  // namespace

postprocess::Question question_of(const Test& test, const Ground& ground,
                                  const SoilVariant& variant, double accuracy, int threads) {
  const models::ConstantHead& protocol = test.protocol;
  postprocess::Question question;
  question.viscosity_ratio = models::viscosity_ratio(ground.water_temperature);
  solver::TestSetup& setup = question.setup;
  setup.soil = at_temperature(variant.soil, question.viscosity_ratio);
  setup.initial_head = initial_head(ground.moisture, variant.soil);
  setup.ring = test.ring;
  setup.pond_head = protocol.head;
  setup.duration = protocol.longest;
  const std::size_t index = variant_index(ground, variant);
  add_ground(ground, index, question.viscosity_ratio, setup);
  setup.outer_ring = test.outer_ring;
  setup.program = pond_program(test);
  setup.outer_program = outer_pond_program(test);
  question.reading_interval =
      protocol.reading_interval.value_or(std::max(60.0, 0.05 * protocol.longest));
  if (protocol.stop) {
    question.stop_readings = protocol.stop->readings;
    question.stop_within = protocol.stop->within;
  }
  question.gauge = gauge_of(test);
  question.rules = rules_of(test);
  question.true_Kfs = true_Kfs(ground, index, question.viscosity_ratio);
  question.circumstances = circumstances_of(test, ground);
  question.assumed_alpha_star = test.assumed_alpha_star;
  question.accuracy = accuracy;
  question.threads = threads;
  return question;
}

}  // namespace ringwright::cases
