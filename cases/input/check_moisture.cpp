#include "cases/input/check_moisture.hpp"

#include <fmt/format.h>

namespace ringwright::cases {
namespace {

// A content or degree of saturation must lie between theta_r and theta_s of every soil meant.
void check_content(const SectionReader& section, const std::string& moisture_key,
                   const std::string& soil_key, const GroundLayer& layer, Reading& reading) {
  const std::string key = moisture_key.empty() ? soil_key : moisture_key;
  for (const SoilVariant& variant : layer.variants) {
    const models::Soil& soil = variant.soil;
    const Moisture& moisture = layer.moisture;
    const double content =
        moisture.water_content.value_or(moisture.saturation.value_or(0.0) * soil.theta_s);
    const std::string front = section.front_of(key);
    const std::string given = fmt::format("water content {:.3g} %", 100 * content);
    if (content >= soil.theta_s) {
      reading.contradiction(
          section.value_place(key),
          fmt::format("{}{} is not below saturation, {:.3g} %", front, given, 100 * soil.theta_s),
          section.key_place(soil_key),
          fmt::format("theta_s of {}, {}", variant.label, variant.source),
          "give a smaller content, or a suction");
      return;
    }
    if (content <= soil.theta_r || initial_head(moisture, soil) < -1000.0) {
      reading.contradiction(
          section.value_place(key),
          fmt::format("{}{} is drier than this soil gets; its residual content is {:.3g} %", front,
                      given, 100 * soil.theta_r),
          section.key_place(soil_key),
          fmt::format("theta_r of {}, {}", variant.label, variant.source),
          "give a larger content, or a suction");
      return;
    }
  }
}

// A soil that is saturated before the test has nothing left to fill.
void check_fillable(const SectionReader& section, const std::string& moisture_key,
                    const std::string& soil_key, const GroundLayer& layer, Reading& reading) {
  const std::string key = moisture_key.empty() ? soil_key : moisture_key;
  for (const SoilVariant& variant : layer.variants) {
    const double head = initial_head(layer.moisture, variant.soil);
    if (!is_saturated(variant.soil, head)) continue;
    const double entry = variant.soil.curves->entry_head();
    reading.contradiction(
        section.value_place(key),
        fmt::format("{}at suction {:.3g} cm this soil is still saturated: there is nothing to fill",
                    section.front_of(key), -100 * head),
        section.key_place(soil_key),
        fmt::format("{}, {} drains from a suction of {:.3g} cm", variant.label, variant.source,
                    -100 * entry),
        "give a larger suction");
    return;
  }
}

}  // namespace

bool is_saturated(const models::Soil& soil, double h) {
  const double entry = soil.curves->entry_head();
  return !(h < entry * (1 + 1e-9) || (entry == 0.0 && h < 0.0));
}

void check_moisture(const SectionReader& section, const std::string& moisture_key,
                    const std::string& soil_key, const GroundLayer& layer, Reading& reading) {
  if (layer.moisture.suction)
    check_fillable(section, moisture_key, soil_key, layer, reading);
  else
    check_content(section, moisture_key, soil_key, layer, reading);
}

}  // namespace ringwright::cases
