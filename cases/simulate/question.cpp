#include "cases/simulate/question.hpp"

#include <algorithm>

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
  setup.water_table = ground.water_table;
  if (!ground.water_table) setup.hydrostatic_to = ground.moisture.hydrostatic_to;
  setup.disturbed = ground.disturbed;
  setup.gap = ground.gap;
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
  add_ground(ground, variant_index(ground, variant), question.viscosity_ratio, setup);
  setup.outer_ring = test.outer_ring;
  setup.program = pond_program(test);
  setup.outer_program = outer_pond_program(test);
  question.reading_interval =
      protocol.reading_interval.value_or(std::max(60.0, 0.05 * protocol.longest));
  if (protocol.stop) {
    question.stop_readings = protocol.stop->readings;
    question.stop_within = protocol.stop->within;
  }
  question.assumed_alpha_star = test.assumed_alpha_star;
  question.accuracy = accuracy;
  question.threads = threads;
  return question;
}

}  // namespace ringwright::cases
