#include "cases/simulate/resolved_case.hpp"

#include <string_view>

namespace ringwright::cases {
namespace {

using nlohmann::json;

json with_unit(double value, std::string_view unit) { return {{"value", value}, {"unit", unit}}; }

json moisture_json(const Moisture& moisture) {
  json result = {{"words", moisture.words}};
  if (moisture.suction) result["suction"] = with_unit(*moisture.suction, "m");
  if (moisture.water_content) result["water_content"] = with_unit(*moisture.water_content, "1");
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
          {"initial_head", with_unit(initial_head(moisture, soil), "m")}};
}

json ground_json(const Ground& ground) {
  json soils = json::array();
  for (const SoilVariant& variant : ground.variants) {
    soils.push_back(soil_json(variant, ground.moisture));
  }
  return {{"water_temperature", with_unit(ground.water_temperature, "degC")},
          {"moisture", moisture_json(ground.moisture)},
          {"soils", soils}};
}

json stop_json(const models::ConstantHead& protocol) {
  json result = {{"longest", with_unit(protocol.longest, "s")}};
  if (protocol.stop) {
    result["readings"] = protocol.stop->readings;
    result["within"] = with_unit(protocol.stop->within, "1");
  }
  return result;
}

json test_json(const Test& test) {
  json result = {{"name", test.name},
                 {"ring_radius", with_unit(test.ring.radius, "m")},
                 {"insertion", with_unit(test.ring.insertion, "m")},
                 {"wall_thickness", with_unit(test.wall_thickness, "m")},
                 {"head", with_unit(test.protocol.head, "m")},
                 {"stop", stop_json(test.protocol)},
                 {"assumed_alpha_star", with_unit(test.assumed_alpha_star, "1/m")},
                 {"ruler", with_unit(test.ruler, "m")},
                 {"head_kept", with_unit(test.head_kept, "m")}};
  if (const auto interval = test.protocol.reading_interval) {
    result["reading_interval"] = with_unit(*interval, "s");
  }
  return result;
}

}  // namespace

json resolved_case(const Case& what) {
  json tests = json::array();
  for (const Test& test : what.tests) tests.push_back(test_json(test));
  json assumed = json::array();
  for (const Assumption& assumption : what.assumed) {
    assumed.push_back({{"key", assumption.key}, {"text", assumption.text}});
  }
  return {{"job", what.job},
          {"accuracy", with_unit(what.accuracy, "1")},
          {"ground", ground_json(what.ground)},
          {"tests", tests},
          {"assumed", assumed}};
}

}  // namespace ringwright::cases
