#include "cases/simulate/resolved_case.hpp"

#include "cases/simulate/resolved_test.hpp"

namespace ringwright::cases {
namespace {

using nlohmann::json;

json moisture_json(const Moisture& moisture) {
  json result = {{"words", moisture.words}};
  if (moisture.suction) result["suction"] = with_unit(*moisture.suction, "m");
  if (moisture.water_content) result["water_content"] = with_unit(*moisture.water_content, "1");
  if (moisture.hydrostatic_to) result["hydrostatic_to"] = with_unit(*moisture.hydrostatic_to, "m");
  if (moisture.saturation) result["saturation"] = with_unit(*moisture.saturation, "1");
  return result;
}

json soil_json(const SoilVariant& variant, const Moisture& moisture) {
  const models::Soil& soil = variant.soil;
  return {{"label", variant.label},
          {"source", variant.source},
          {"curves", soil.curves->describe()},
          {"theta_r", with_unit(soil.theta_r, "1")},
          {"theta_s", with_unit(soil.theta_s, "1")},
          {"Kfs_at_20_degC", with_unit(soil.Ks, "m/s")},
          {"specific_storage", with_unit(soil.specific_storage, "1/m")},
          {"horizontal_over_vertical_K", soil.anisotropy},
          {"initial_head", with_unit(initial_head(moisture, soil), "m")}};
}

json layer_json(const GroundLayer& layer) {
  json soils = json::array();
  for (const SoilVariant& variant : layer.variants)
    soils.push_back(soil_json(variant, layer.moisture));
  return {{"name", layer.name},
          {"top", with_unit(layer.top, "m")},
          {"moisture", moisture_json(layer.moisture)},
          {"soils", soils}};
}

// What is not there has no key.
void add_place(const Ground& ground, json& result) {
  if (ground.test_level > 0) result["test_level_below_ground"] = with_unit(ground.test_level, "m");
  for (const GroundLayer& layer : ground.layers_below)
    result["layers_below"].push_back(layer_json(layer));
  if (ground.water_table) result["water_table"] = with_unit(*ground.water_table, "m");
  if (ground.disturbed)
    result["disturbed"] = {{"width", with_unit(ground.disturbed->width, "m")},
                           {"Ks_factor", ground.disturbed->factor}};
  if (ground.gap) result["wall_gap"] = with_unit(ground.gap->width, "m");
  if (ground.liner) result["liner"] = with_unit(*ground.liner, "m");
  if (ground.wet_density) result["wet_density"] = with_unit(*ground.wet_density, "kg/m3");
  if (!ground.truth_layer.empty()) result["true_Kfs_of"] = ground.truth_layer;
}

json ground_json(const Ground& ground) {
  json soils = json::array();
  for (const SoilVariant& variant : ground.variants) {
    soils.push_back(soil_json(variant, ground.moisture));
  }
  json result = {{"water_temperature", with_unit(ground.water_temperature, "degC")},
                 {"moisture", moisture_json(ground.moisture)},
                 {"soils", soils}};
  add_place(ground, result);
  return result;
}

json words(const std::vector<Assumption>& list) {
  json result = json::array();
  for (const Assumption& line : list) result.push_back({{"key", line.key}, {"text", line.text}});
  return result;
}

}  // namespace

json resolved_case(const Case& what) {
  json tests = json::array();
  for (const Test& test : what.tests) tests.push_back(resolved_test(test));
  return {{"job", what.job},
          {"accuracy", with_unit(what.accuracy, "1")},
          {"ground", ground_json(what.ground)},
          {"tests", tests},
          {"assumed", words(what.assumed)},
          {"warnings", words(what.warnings)}};
}

}  // namespace ringwright::cases
