#include "cases/input/read_phrases.hpp"

#include <fmt/format.h>

#include <cctype>
#include <string>
#include <vector>

#include "cases/input/phrase_parts.hpp"
#include "cases/input/suggestion.hpp"
#include "models/soil/alpha_star_class.hpp"
#include "models/soil/moisture.hpp"
#include "models/water/viscosity.hpp"

namespace ringwright::cases {
namespace {

constexpr double published_temperature = 20.0;

}  // namespace

std::optional<double> read_conductivity(const SectionReader& section, std::string_view key,
                                        Reading& reading) {
  const auto text = section.text(key);
  if (!text) return std::nullopt;
  if (text->find(',') != std::string::npos &&
      !std::isdigit(static_cast<unsigned char>((*text)[text->find(',') + 1]))) {
    section.problem(key, fmt::format("'{}' says more than is understood here", *text),
                    "write one value and its temperature, such as 18 mm/h at 20 degC");
    return std::nullopt;
  }
  const auto halves = split(*text, " at ");
  const auto value = section.quantity_in(key, halves[0]);
  double temperature = published_temperature;
  if (halves.size() > 1) {
    const auto given = part(section, key, halves[1], Dimension::temperature,
                            {0, 50, "0 degC to 50 degC"}, reading);
    if (!given) return std::nullopt;
    temperature = *given;
  } else {
    reading.assume(section.path_of(key), fmt::format("{} at 20 degC", key));
  }
  if (!value) return std::nullopt;
  return *value * models::viscosity_ratio(temperature);
}

std::optional<double> read_alpha_star(const SectionReader& section, std::string_view key) {
  const auto text = section.text(key);
  if (!text) return std::nullopt;
  std::vector<std::string> words;
  for (const models::AlphaStarClass& candidate : models::alpha_star_classes()) {
    if (normalised(*text) == candidate.word) return candidate.alpha_star;
    words.emplace_back(candidate.word);
  }
  const bool is_word = std::isalpha(static_cast<unsigned char>(text->front()));
  if (!is_word) return section.quantity_in(key, *text);
  section.problem(key, fmt::format("'{}' is neither a value such as 0.12 1/cm nor a class", *text),
                  suggest(*text, words));
  return std::nullopt;
}

std::optional<Moisture> read_moisture(const SectionReader& section, std::string_view key,
                                      std::string_view text, Reading& reading) {
  const std::string word = normalised(text);
  if (const auto suction = models::suction_of_word(word)) return Moisture{word, suction, {}, {}};
  Moisture moisture{std::string(text), {}, {}, {}};
  std::string_view value = text;
  if (take_front(value, "suction ")) {
    moisture.suction = part(section, key, value, Dimension::head,
                            {0.01, 1000, "1 cm to 1000 m of suction"}, reading);
  } else if (take_front(value, "content ")) {
    moisture.water_content = part(section, key, value, Dimension::fraction,
                                  {0.001, 0.95, "0.1 % to 95 % of water"}, reading);
  } else if (take_front(value, "hydrostatic to ")) {
    take_back(value, " below ground");
    moisture.hydrostatic_to = part(section, key, value, Dimension::length,
                                   {0.01, 1000, "1 cm to 1000 m below ground"}, reading);
  } else if (value.ends_with(" full")) {
    value.remove_suffix(5);
    moisture.saturation = part(section, key, value, Dimension::fraction,
                               {0.001, 0.9999, "above 0 % and below 100 % full"}, reading);
  } else {
    section.problem(
        key, fmt::format("'{}' does not say a moisture", text),
        "write dry, moist, wet, or for example: suction 300 cm, content 25 %, 60 % full, "
        "hydrostatic to 2 m");
  }
  const bool any =
      moisture.suction || moisture.water_content || moisture.saturation || moisture.hydrostatic_to;
  return any ? std::optional(moisture) : std::nullopt;
}

std::optional<ReadWords> read_readings(const SectionReader& section, Reading& reading) {
  const auto text = section.text("read");
  if (!text) return std::nullopt;
  ReadWords words;
  for (std::string_view phrase : split(*text, ",")) {
    if (take_front(phrase, "ruler to ")) {
      words.ruler = part(section, "read", phrase, Dimension::length,
                         {1e-5, 0.1, "0.01 mm to 10 cm"}, reading);
    } else if (take_front(phrase, "head kept to ")) {
      words.head_kept =
          part(section, "read", phrase, Dimension::head, {0, 1, "0 mm to 1 m"}, reading);
    } else {
      take_front(phrase, "every ");
      words.interval = section.quantity_in("read", phrase);
    }
  }
  return words;
}

}  // namespace ringwright::cases
