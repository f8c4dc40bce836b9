#include "cases/input/read_ground.hpp"

#include <fmt/format.h>

#include "cases/input/read_phrases.hpp"
#include "cases/input/read_soil.hpp"
#include "models/soil/moisture.hpp"

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

// Fills the moisture. @return the key it was given by, empty for the default; none if it is wrong
std::optional<std::string> read_moisture_of(const SectionReader& section,
                                            const std::optional<TextureWords>& texture,
                                            Ground& ground, Reading& reading) {
  const bool in_texture = texture && texture->moisture;
  if (in_texture && section.has("moisture")) {
    reading.contradiction(section.value_place("moisture"),
                          section.front_of("moisture") + "the moisture is given twice",
                          section.value_place("texture"), "also given here", "keep one of the two");
  }
  std::optional<Moisture> moisture;
  std::string key = in_texture ? "texture" : "moisture";
  if (in_texture) {
    moisture = read_moisture(section, "texture", *texture->moisture, reading);
  } else if (const auto text = section.text("moisture")) {
    moisture = read_moisture(section, "moisture", *text, reading);
  } else if (!section.has("moisture")) {
    moisture = Moisture{"moist", models::suction_of_word("moist"), {}, {}};
    key = "";
  }
  if (!moisture) return std::nullopt;
  ground.moisture = *moisture;
  return key;
}

// A content or degree of saturation must lie between theta_r and theta_s of every soil meant.
void check_moisture(const SectionReader& section, const std::string& moisture_key,
                    const std::string& soil_key_name, const Ground& ground, Reading& reading) {
  for (const SoilVariant& variant : ground.variants) {
    const models::Soil& soil = variant.soil;
    const Moisture& moisture = ground.moisture;
    const double content =
        moisture.water_content.value_or(moisture.saturation.value_or(0.0) * soil.theta_s);
    const std::string front = section.front_of(moisture_key);
    const std::string given = fmt::format("water content {:.3g} %", 100 * content);
    if (content >= soil.theta_s) {
      reading.contradiction(
          section.value_place(moisture_key),
          fmt::format("{}{} is not below saturation, {:.3g} %", front, given, 100 * soil.theta_s),
          section.key_place(soil_key_name),
          fmt::format("theta_s of {}, {}", variant.label, variant.source),
          "give a smaller content, or a suction");
      return;
    }
    if (content <= soil.theta_r || initial_head(moisture, soil) < -1000.0) {
      reading.contradiction(
          section.value_place(moisture_key),
          fmt::format("{}{} is drier than this soil gets; its residual content is {:.3g} %", front,
                      given, 100 * soil.theta_r),
          section.key_place(soil_key_name),
          fmt::format("theta_r of {}, {}", variant.label, variant.source),
          "give a larger content, or a suction");
      return;
    }
  }
}

// A soil that is saturated before the test has nothing left to fill.
void check_fillable(const SectionReader& section, const std::string& moisture_key,
                    const std::string& soil_key_name, const Ground& ground, Reading& reading) {
  const std::string key = moisture_key.empty() ? soil_key_name : moisture_key;
  for (const SoilVariant& variant : ground.variants) {
    const double head = initial_head(ground.moisture, variant.soil);
    const double entry = variant.soil.curves->entry_head();
    if (head < entry * (1 + 1e-9) || (entry == 0.0 && head < 0.0)) continue;
    reading.contradiction(
        section.value_place(key),
        fmt::format("{}at suction {:.3g} cm this soil is still saturated: there is nothing to fill",
                    section.front_of(key), -100 * head),
        section.key_place(soil_key_name),
        fmt::format("{}, {} drains from a suction of {:.3g} cm", variant.label, variant.source,
                    -100 * entry),
        "give a larger suction");
    return;
  }
}

// "moist" = suction 300 cm (27 % water, 63 % full)
void echo_moisture(const std::string& moisture_key, const SectionReader& section,
                   const Ground& ground, Reading& reading) {
  const Moisture& moisture = ground.moisture;
  if (!models::suction_of_word(moisture.words)) return;
  std::string contents;
  for (const SoilVariant& variant : ground.variants) {
    const auto state = models::moisture_at_suction(variant.soil, *moisture.suction);
    contents += fmt::format("{}{:.0f} % water, {:.0f} % full", contents.empty() ? "" : "; ",
                            100 * state.water_content, 100 * state.degree_of_saturation);
  }
  reading.assume(section.path_of(moisture_key.empty() ? "moisture" : moisture_key),
                 fmt::format("\"{}\" = suction {:g} cm ({})", moisture.words,
                             100 * *moisture.suction, contents));
}

void read_storage(const SectionReader& section, Ground& ground, Reading& reading) {
  const auto storage = section.quantity("specific storage");
  if (!section.has("specific storage")) {
    reading.assume(section.path_of("specific storage"), "specific storage 0 1/m");
  }
  for (SoilVariant& variant : ground.variants)
    variant.soil.specific_storage = storage.value_or(0.0);
}

}  // namespace

Ground read_ground(const LocatedNode& node, const Place& where, const Key& grammar,
                   Reading& reading) {
  Ground ground;
  const SectionReader section(node, grammar.keys, "ground", where, reading);
  if (section.is_broken()) return ground;
  read_water(section, ground, reading);
  const std::string key = soil_key(section, where, reading);
  const auto texture = read_texture(section);
  const auto moisture_key = read_moisture_of(section, texture, ground, reading);
  ground.variants = read_soil(section, key, texture, ground.moisture.suction, reading);
  read_storage(section, ground, reading);
  if (const auto name = section.text("name")) {
    for (SoilVariant& variant : ground.variants) variant.label = *name;
  }
  if (!moisture_key || ground.variants.empty()) return ground;
  if (!ground.moisture.suction)
    check_moisture(section, *moisture_key, key, ground, reading);
  else
    check_fillable(section, *moisture_key, key, ground, reading);
  echo_moisture(*moisture_key, section, ground, reading);
  return ground;
}

}  // namespace ringwright::cases
