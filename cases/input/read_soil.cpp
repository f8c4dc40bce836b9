#include "cases/input/read_soil.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/input/minimum_capillary_height.hpp"
#include "cases/input/read_capillary_soil.hpp"
#include "cases/input/read_parameters.hpp"
#include "cases/input/read_phrases.hpp"
#include "cases/input/suggestion.hpp"
#include "models/soil/catalogue.hpp"

namespace ringwright::cases {
namespace {

std::vector<std::string> published_sources() {
  std::vector<std::string> sources;
  for (const models::PublishedSoil& row : models::published_soils()) {
    if (std::find(sources.begin(), sources.end(), row.source) == sources.end())
      sources.emplace_back(row.source);
  }
  return sources;
}

// The rows of the class in the tables wanted.
std::vector<models::PublishedSoil> rows_of(const SectionReader& ground, const std::string& texture,
                                           Reading& reading) {
  auto rows = models::published_soils_of(texture);
  if (rows.empty()) {
    std::vector<std::string> classes;
    for (const auto name : models::texture_classes()) classes.emplace_back(name);
    ground.problem("texture", fmt::format("'{}' is not a texture class", texture),
                   suggest(texture, classes));
  }
  if (!ground.has("published")) {
    reading.assume(ground.path_of("published"),
                   fmt::format("published soils of {}", fmt::join(published_sources(), " and ")));
    return rows;
  }
  const auto wanted = ground.text("published");
  if (!wanted) return {};
  const auto sources = published_sources();
  const bool known = std::any_of(sources.begin(), sources.end(), [&](const auto& source) {
    return normalised(source) == normalised(*wanted);
  });
  if (!known)
    ground.problem("published", fmt::format("'{}' is not a table of published soils", *wanted),
                   suggest(*wanted, sources));
  std::erase_if(rows,
                [&](const auto& row) { return normalised(row.source) != normalised(*wanted); });
  return rows;
}

std::vector<SoilVariant> read_published(const SectionReader& ground, const TextureWords& words,
                                        Reading& reading) {
  const auto rows = rows_of(ground, words.texture, reading);
  const auto Kfs = ground.has("Kfs") ? read_conductivity(ground, "Kfs", reading) : std::nullopt;
  if (!ground.has("Kfs")) reading.assume(ground.path_of("Kfs"), "published Ks taken as Kfs");
  if (rows.empty()) return {};
  std::vector<double> n;
  for (const auto& row : rows) n.push_back(row.n);
  const auto h_s = read_minimum_capillary_height(ground, n, "texture", reading);
  std::vector<SoilVariant> variants;
  for (const auto& row : rows) {
    SoilVariant variant{words.texture, std::string(row.source), models::make_soil(row, h_s)};
    if (Kfs) variant.soil.Ks = *Kfs;
    variants.push_back(std::move(variant));
  }
  return variants;
}

void refuse_strays(const SectionReader& ground, const std::string& key, Reading& reading) {
  const bool capillary = key == "capillary length" || key == "alpha star";
  if (key != "texture" && ground.has("published")) {
    reading.contradiction(
        ground.key_place("published"),
        ground.front_of("published") + "only a texture is looked up in published soils",
        ground.key_place(key), "the soil is given here", "leave one of the two out");
  }
  if (!capillary && ground.has("fillable porosity")) {
    reading.contradiction(
        ground.key_place("fillable porosity"),
        ground.front_of("fillable porosity") + "this soil has its own water contents",
        ground.key_place(key), "the soil is given here",
        "fillable porosity goes with capillary length or alpha star");
  }
}

// Without a soil to build, the values beside it are still looked at.
void check_values(const SectionReader& ground, Reading& reading) {
  ground.quantity("capillary length");
  ground.quantity("fillable porosity");
  read_alpha_star(ground, "alpha star");
  read_conductivity(ground, "Kfs", reading);
}

}  // namespace

std::optional<TextureWords> read_texture(const SectionReader& ground) {
  const auto text = ground.text("texture");
  if (!text) return std::nullopt;
  const std::size_t comma = text->find(',');
  TextureWords words{normalised(text->substr(0, comma)), {}};
  if (comma != std::string::npos)
    words.moisture = std::string(trimmed(std::string_view(*text).substr(comma + 1)));
  return words;
}

std::string soil_key(const SectionReader& ground, const Place& where, Reading& reading) {
  std::string found;
  bool several = false;
  const char* const keys[] = {"texture", "parameters", "capillary length", "alpha star"};
  for (const char* key : keys) {
    if (!ground.has(key)) continue;
    if (found.empty()) {
      found = key;
      continue;
    }
    several = true;
    const bool later = ground.key_place(key).line > ground.key_place(found).line;
    const std::string second = later ? key : found, first = later ? found : key;
    reading.contradiction(
        ground.key_place(second),
        fmt::format("{}the soil is already given by '{}'", ground.front_of(second), first),
        ground.key_place(first), "given here", "keep one of the two");
  }
  const bool misspelt = std::any_of(std::begin(keys), std::end(keys),
                                    [&](const char* key) { return ground.is_suggested(key); });
  if (found.empty() && !misspelt) {
    reading.problem(where, ground.front() + "the soil is missing",
                    "give texture, or parameters, or capillary length with fillable porosity and "
                    "Kfs");
  }
  return several ? "" : found;
}

std::vector<SoilVariant> read_soil(const SectionReader& ground, const std::string& key,
                                   const std::optional<TextureWords>& texture,
                                   std::optional<double> suction, Reading& reading) {
  if (key.empty()) {
    check_values(ground, reading);
    return {};
  }
  refuse_strays(ground, key, reading);
  if (key == "parameters") return read_parameters(ground, reading);
  if (key != "texture") return read_capillary_soil(ground, key, suction, reading);
  if (!texture) return {};
  return read_published(ground, *texture, reading);
}

}  // namespace ringwright::cases
