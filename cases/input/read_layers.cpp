#include "cases/input/read_layers.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/input/phrase_parts.hpp"
#include "cases/input/suggestion.hpp"

namespace ringwright::cases {
namespace {

LocatedNode scalar(std::string_view text, const LocatedNode& at) {
  LocatedNode node;
  node.kind = LocatedNode::Kind::scalar;
  node.place = at.place;
  node.text = text;
  return node;
}

// "clay loam, wet from 5 ft down" as { texture: "clay loam, wet", from: 5 ft }
LocatedNode spelled_out(const LocatedNode& item) {
  if (item.kind != LocatedNode::Kind::scalar) return item;
  const auto halves = split(item.text, " from ");
  LocatedNode block;
  block.kind = LocatedNode::Kind::map;
  block.place = item.place;
  block.entries.emplace_back(scalar("texture", item), scalar(halves[0], item));
  if (halves.size() > 1) {
    std::string_view from = halves[1];
    take_back(from, " down");
    block.entries.emplace_back(scalar("from", item), scalar(from, item));
  }
  return block;
}

// Depth below ground; none if it is missing or out of order, which is reported.
std::optional<double> read_from(const SectionReader& layer, const Place& where, bool uppermost,
                                std::optional<double> above, const Place& above_place,
                                Reading& reading) {
  if (!layer.has("from")) {
    if (uppermost) return 0.0;
    reading.problem(where, layer.front() + "the key 'from' is missing", "for example  from: 40 cm");
    return std::nullopt;
  }
  const auto from = layer.quantity("from");
  if (!from) return std::nullopt;
  if (uppermost && *from > 0) {
    layer.problem("from", "the uppermost layer begins at the surface of the ground",
                  "write  from: 0 cm, or give the soil above it");
    return std::nullopt;
  }
  if (above && *from <= *above) {
    reading.contradiction(layer.value_place("from"),
                          layer.front_of("from") + "a layer begins below the one before it",
                          above_place, "the layer before begins here",
                          "list the layers from the surface down");
    return std::nullopt;
  }
  return from;
}

}  // namespace

void read_layers(const SectionReader& section, const GroundContext& context, bool own_soil,
                 std::vector<GroundLayer>& layers, Reading& reading) {
  if (!section.has("layers")) return;
  const std::vector<Key>& keys = section.grammar_of("layers").keys;
  GroundContext of_layers = context;
  of_layers.is_layer = true;
  std::optional<double> above;
  Place above_place = section.key_place("layers");
  if (own_soil) above = 0.0;
  int number = 0;
  for (const LocatedNode* item : section.items("layers")) {
    const LocatedNode node = spelled_out(*item);
    const std::string path = fmt::format("{}.{}", section.path_of("layers"), ++number);
    const SectionReader layer(node, keys, path, item->place, reading);
    if (layer.is_broken()) continue;
    const bool uppermost = !own_soil && number == 1;
    const auto from = read_from(layer, item->place, uppermost, above, above_place, reading);
    if (from) {
      above = from;
      above_place = layer.has("from") ? layer.value_place("from") : item->place;
    }
    layers.push_back(read_layer(layer, item->place, from.value_or(0.0) - context.test_level,
                                of_layers, reading));
  }
}

std::vector<GroundLayer> below_test_level(std::vector<GroundLayer> layers) {
  const auto buried = std::find_if(layers.begin(), layers.end(),
                                   [](const GroundLayer& layer) { return layer.top > 1e-9; });
  // The one before the first that begins below the test level holds it.
  if (buried - layers.begin() > 1) layers.erase(layers.begin(), buried - 1);
  if (!layers.empty()) layers.front().top = 0.0;
  return layers;
}

std::vector<GroundLayer> paired(const SectionReader& section, std::vector<GroundLayer> layers,
                                Reading& reading) {
  const GroundLayer* widest = nullptr;
  for (const GroundLayer& layer : layers) {
    if (layer.variants.empty()) return {};
    if (!widest || layer.variants.size() > widest->variants.size()) widest = &layer;
  }
  if (!widest || widest->variants.size() < 2) return layers;
  std::vector<GroundLayer> result = layers;
  for (GroundLayer& layer : result) layer.variants.clear();
  for (const SoilVariant& wanted : widest->variants) {
    std::vector<SoilVariant> row;
    for (const GroundLayer& layer : layers) {
      const auto found =
          std::find_if(layer.variants.begin(), layer.variants.end(),
                       [&](const SoilVariant& variant) { return variant.source == wanted.source; });
      if (found != layer.variants.end())
        row.push_back(*found);
      else if (layer.variants.size() == 1)
        row.push_back(layer.variants.front());
    }
    if (row.size() != layers.size()) continue;
    if (row.front().source != wanted.source) row.front().source += ", below " + wanted.source;
    for (std::size_t i = 0; i < row.size(); ++i) result[i].variants.push_back(row[i]);
  }
  if (result.front().variants.empty()) {
    section.problem("layers", "no published table has all these soils",
                    "name one soil by parameters");
  } else if (layers.size() > 1) {
    reading.assume(section.path_of("layers"),
                   "layers go together by published table, never one table over another");
  }
  return result;
}

std::vector<std::string> layer_names(const Ground& ground) {
  std::vector<std::string> names;
  if (!ground.variants.empty()) names.push_back(ground.variants.front().label);
  for (const GroundLayer& layer : ground.layers_below) names.push_back(layer.name);
  return names;
}

std::optional<std::string> layer_called(std::string_view name, const Ground& ground) {
  for (const std::string& candidate : layer_names(ground)) {
    if (normalised(candidate) == normalised(name)) return candidate;
  }
  return std::nullopt;
}

}  // namespace ringwright::cases
