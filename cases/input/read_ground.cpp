#include "cases/input/read_ground.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>

#include "cases/input/read_layer.hpp"
#include "cases/input/read_layers.hpp"
#include "cases/input/read_walls.hpp"
#include "cases/input/read_water_table.hpp"

namespace ringwright::cases {
namespace {

void read_water(const SectionReader& section, Ground& ground, Reading& reading) {
  if (const auto water = section.quantity("water")) {
    ground.water_temperature = *water;
  } else if (!section.has("water")) {
    reading.assume(section.path_of("water"),
                   fmt::format("water {:g} degC", ground.water_temperature));
  }
}

double read_storage(const SectionReader& section, Reading& reading) {
  if (!section.has("specific storage"))
    reading.assume(section.path_of("specific storage"), "specific storage 0 1/m");
  return section.quantity("specific storage").value_or(0.0);
}

bool names_a_soil(const SectionReader& section) {
  constexpr std::array keys{"texture", "parameters", "capillary length", "alpha star"};
  return std::any_of(keys.begin(), keys.end(), [&](const char* key) {
    return section.has(key) || section.is_suggested(key);
  });
}

void take_uppermost(std::vector<GroundLayer> layers, Ground& ground) {
  if (layers.empty()) return;
  ground.variants = std::move(layers.front().variants);
  ground.moisture = layers.front().moisture;
  layers.erase(layers.begin());
  ground.layers_below = std::move(layers);
}

void read_truth(const SectionReader& section, Ground& ground, GroundPlaces& places,
                Reading& reading) {
  const auto truth = section.text("true Kfs of");
  if (!truth || ground.variants.empty()) {
    if (!section.has("true Kfs of") && !ground.layers_below.empty())
      reading.assume(section.path_of("true Kfs of"),
                     "true Kfs is that of the layer holding the foot of the wall");
    return;
  }
  places.truth = section.value_place("true Kfs of");
  if (const auto name = layer_called(*truth, ground)) {
    ground.truth_layer = *name;
    return;
  }
  section.problem("true Kfs of", fmt::format("there is no layer '{}' below the test", *truth),
                  fmt::format("layers: {}", fmt::join(layer_names(ground), ", ")));
}

// Said once, for what no key speaks of.
void assume_plain_ground(const SectionReader& section, const Ground& ground, Reading& reading) {
  if (ground.layers_below.empty() && !ground.water_table && !section.has("layers"))
    reading.assume(section.path_of("layers"),
                   "the same soil all the way down, no water table within reach");
  if (!ground.gap && !ground.disturbed)
    reading.assume(section.path_of("wall gap"), "no gap and no disturbed soil along the wall");
}

}  // namespace

Ground read_ground(const LocatedNode& node, const Place& where, const Key& grammar,
                   GroundPlaces& places, Reading& reading) {
  Ground ground;
  const SectionReader section(node, grammar.keys, "ground", where, reading);
  if (section.is_broken()) return ground;
  read_water(section, ground, reading);
  GroundContext context;
  context.specific_storage = read_storage(section, reading);
  context.test_level = ground.test_level = read_test_level(section);
  context.table = read_water_table(section, ground, reading);
  if (context.table) places.water_table = context.table->place;
  std::vector<GroundLayer> layers;
  const bool own_soil = names_a_soil(section) || !section.has("layers");
  if (own_soil) {
    layers.push_back(read_layer(section, where, -ground.test_level, context, reading));
    // A moisture that was refused would be refused again in every layer.
    if (!layers.front().variants.empty()) context.moisture = layers.front().moisture;
  } else {
    context.moisture = common_moisture(section, context, reading);
  }
  read_layers(section, context, own_soil, layers, reading);
  take_uppermost(paired(section, below_test_level(std::move(layers)), reading), ground);
  check_surface(section, ground, context, reading);
  read_walls(section, ground);
  ground.wet_density = section.quantity("wet density");
  ground.liner = section.quantity("liner");
  if (ground.liner) places.liner = section.value_place("liner");
  read_truth(section, ground, places, reading);
  assume_plain_ground(section, ground, reading);
  return ground;
}

}  // namespace ringwright::cases
