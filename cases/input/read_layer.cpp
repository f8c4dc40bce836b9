#include "cases/input/read_layer.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/input/check_moisture.hpp"
#include "cases/input/read_phrases.hpp"
#include "cases/input/read_soil.hpp"
#include "models/soil/moisture.hpp"

namespace ringwright::cases {
namespace {

Moisture hydrostatic(const TableWords& table, double depth) {
  Moisture moisture;
  moisture.words = table.stays ? "hydrostatic to the water table" : "hydrostatic";
  moisture.hydrostatic_to = table.depth;
  // At the layer's upper edge; what lies in the water has the smallest suction a soil may have.
  moisture.suction = std::max(0.01, table.depth - depth);
  return moisture;
}

void refuse_second_moisture(const SectionReader& section, const std::string& key,
                            const GroundContext& context, Reading& reading) {
  reading.contradiction(section.value_place(key),
                        section.front_of(key) + "the moisture is given twice", context.table->place,
                        context.table->stays ? "the ground is hydrostatic to the water table"
                                             : "the ground is hydrostatic to this depth",
                        "leave the moisture out");
}

// @return the key it was given by, empty for a default; none if it is wrong
std::optional<std::string> moisture_of(const SectionReader& section,
                                       const std::optional<TextureWords>& texture, double depth,
                                       const GroundContext& context, GroundLayer& layer,
                                       Reading& reading) {
  const bool in_texture = texture && texture->moisture;
  if (in_texture && section.has("moisture")) {
    reading.contradiction(section.value_place("moisture"),
                          section.front_of("moisture") + "the moisture is given twice",
                          section.value_place("texture"), "also given here", "keep one of the two");
  }
  const std::string key = in_texture ? "texture" : "moisture";
  const auto given = in_texture ? texture->moisture : section.text("moisture");
  const bool of_table = given && context.table && !context.is_layer && !in_texture &&
                        given->starts_with("hydrostatic");
  if (context.table) {
    if (given && !of_table) refuse_second_moisture(section, key, context, reading);
    layer.moisture = hydrostatic(*context.table, depth);
    return given ? key : "";
  }
  // A depth of the whole ground that was reported already.
  if (given && !context.is_layer && given->starts_with("hydrostatic")) return std::nullopt;
  if (!given) {
    if (section.has("moisture")) return std::nullopt;
    layer.moisture =
        context.moisture.value_or(Moisture{"moist", models::suction_of_word("moist"), {}, {}});
    return "";
  }
  const auto moisture = read_moisture(section, key, *given, reading);
  if (!moisture) return std::nullopt;
  if (moisture->hydrostatic_to) {
    section.problem(key, "a hydrostatic state is one of the whole ground",
                    "give it once, as ground.moisture");
    return std::nullopt;
  }
  layer.moisture = *moisture;
  return key;
}

// "moist" = suction 300 cm (27 % water, 63 % full)
void echo_moisture(const SectionReader& section, const std::string& moisture_key,
                   const GroundLayer& layer, Reading& reading) {
  const Moisture& moisture = layer.moisture;
  if (!models::suction_of_word(moisture.words)) return;
  std::string contents;
  for (const SoilVariant& variant : layer.variants) {
    const auto state = models::moisture_at_suction(variant.soil, *moisture.suction);
    contents += fmt::format("{}{:.0f} % water, {:.0f} % full", contents.empty() ? "" : "; ",
                            100 * state.water_content, 100 * state.degree_of_saturation);
  }
  reading.assume(section.path_of(moisture_key.empty() ? "moisture" : moisture_key),
                 fmt::format("\"{}\" = suction {:g} cm ({})", moisture.words,
                             100 * *moisture.suction, contents));
}

// The ground's own water content says nothing of a layer known by what fills in it.
void refuse_inherited_content(const SectionReader& section, const std::string& soil_key_name,
                              const GroundLayer& layer, Reading& reading) {
  const bool capillary = soil_key_name == "capillary length" || soil_key_name == "alpha star";
  if (!capillary || layer.moisture.suction) return;
  reading.problem(section.key_place(soil_key_name),
                  section.front_of(soil_key_name) +
                      "this soil is known by its fillable porosity only, not by a content",
                  "give this layer its moisture as dry, moist, wet or a suction");
}

}  // namespace

GroundLayer read_layer(const SectionReader& section, const Place& where, double depth,
                       const GroundContext& context, Reading& reading) {
  GroundLayer layer;
  layer.top = depth;
  const std::string key = soil_key(section, where, reading);
  const auto texture = read_texture(section);
  const auto moisture_key = moisture_of(section, texture, depth, context, layer, reading);
  if (moisture_key && moisture_key->empty()) refuse_inherited_content(section, key, layer, reading);
  layer.variants = read_soil(section, key, texture, layer.moisture.suction, reading);
  const auto anisotropy = section.quantity("Kr over Kz");
  const auto name = section.text("name");
  for (SoilVariant& variant : layer.variants) {
    variant.soil.specific_storage = context.specific_storage;
    variant.soil.anisotropy = anisotropy.value_or(1.0);
    if (name) variant.label = *name;
  }
  if (!layer.variants.empty()) layer.name = layer.variants.front().label;
  if (!moisture_key || layer.variants.empty()) return layer;
  if (layer.moisture.hydrostatic_to) {
    layer.moisture.suction.reset();
    return layer;
  }
  check_moisture(section, *moisture_key, key, layer, reading);
  echo_moisture(section, *moisture_key, layer, reading);
  return layer;
}

}  // namespace ringwright::cases
