#include "cases/input/read_water_table.hpp"

#include <fmt/format.h>

#include <cmath>

#include "cases/input/check_moisture.hpp"
#include "cases/input/phrase_parts.hpp"
#include "cases/input/read_phrases.hpp"

namespace ringwright::cases {
namespace {

constexpr std::string_view table_key = "water table";

// "hydrostatic to 2 m" of the ground's own moisture, below ground [m].
std::optional<double> hydrostatic_depth(const SectionReader& section, Reading& reading) {
  if (!section.has("moisture")) return std::nullopt;
  const auto text = section.text("moisture");
  if (!text || !text->starts_with("hydrostatic")) return std::nullopt;
  const auto moisture = read_moisture(section, "moisture", *text, reading);
  return moisture ? moisture->hydrostatic_to : std::nullopt;
}

// Below ground [m].
std::optional<double> table_depth(const SectionReader& section) {
  const auto text = section.text(table_key);
  if (!text) return std::nullopt;
  std::string_view depth = *text;
  take_back(depth, " below ground");
  return section.quantity_in(table_key, depth);
}

std::optional<TableWords> words(const SectionReader& section, std::string_view key, double depth,
                                const Ground& ground, Reading& reading) {
  const double below_test = depth - ground.test_level;
  if (below_test > 0) return TableWords{below_test, section.value_place(key), key == table_key};
  const std::string message =
      fmt::format("{}the {} is not below the level of the test", section.front_of(key),
                  key == table_key ? "water table" : "depth of a hydrostatic state");
  if (section.has("test level")) {
    reading.contradiction(section.value_place(key), message, section.value_place("test level"),
                          "the ring stands here", "both count from the ground");
  } else {
    reading.problem(section.value_place(key), message);
  }
  return std::nullopt;
}

}  // namespace

double read_test_level(const SectionReader& section) {
  const auto text = section.text("test level");
  if (!text) return 0.0;
  std::string_view depth = *text;
  take_back(depth, " below ground");
  return section.quantity_in("test level", depth).value_or(0.0);
}

std::optional<TableWords> read_water_table(const SectionReader& section, Ground& ground,
                                           Reading& reading) {
  const auto hydrostatic = hydrostatic_depth(section, reading);
  const auto table = table_depth(section);
  if (table && hydrostatic && std::abs(*table - *hydrostatic) > 1e-9) {
    reading.contradiction(section.value_place("moisture"),
                          section.front_of("moisture") + "hydrostatic to another depth",
                          section.value_place(table_key), "than the water table",
                          "leave the moisture out: it is hydrostatic to the water table");
    return std::nullopt;
  }
  if (table) {
    const auto result = words(section, table_key, *table, ground, reading);
    if (result) ground.water_table = result->depth;
    if (!section.has("moisture"))
      reading.assume(section.path_of("moisture"), "hydrostatic to the water table");
    return result;
  }
  if (!hydrostatic) return std::nullopt;
  return words(section, "moisture", *hydrostatic, ground, reading);
}

std::optional<Moisture> common_moisture(const SectionReader& section, const GroundContext& context,
                                        Reading& reading) {
  if (context.table || !section.has("moisture")) return std::nullopt;
  const auto text = section.text("moisture");
  return text ? read_moisture(section, "moisture", *text, reading) : std::nullopt;
}

void check_surface(const SectionReader& section, const Ground& ground, const GroundContext& context,
                   Reading& reading) {
  if (!context.table) return;
  for (const SoilVariant& variant : ground.variants) {
    if (!is_saturated(variant.soil, -context.table->depth)) continue;
    reading.problem(
        context.table->place,
        fmt::format("{}{}, {} is saturated up to the level of the test: there is nothing to fill",
                    section.front(), variant.label, variant.source),
        fmt::format("it drains from a suction of {:.3g} cm",
                    -100 * variant.soil.curves->entry_head()));
    return;
  }
}

}  // namespace ringwright::cases
