#include "cases/input/read_phrases.hpp"

#include <fmt/format.h>

#include <cctype>
#include <string>
#include <vector>

#include "cases/input/suggestion.hpp"
#include "models/soil/alpha_star_class.hpp"
#include "models/soil/moisture.hpp"
#include "models/water/viscosity.hpp"

namespace ringwright::cases {
namespace {

constexpr double published_temperature = 20.0;

// A quantity inside a phrase whose range the grammar of the key does not hold.
std::optional<double> part(const SectionReader& section, std::string_view key,
                           std::string_view text, Dimension dimension, const Range& range,
                           Reading& reading) {
  try {
    const double value = reading.units.read(text, dimension);
    if (value >= range.least && value <= range.most) return value;
    section.problem(key, fmt::format("{} is out of range", trimmed(text)),
                    "allowed: " + range.words);
  } catch (const ValueError& error) {
    section.problem(key, error.what(), error.hint());
  }
  return std::nullopt;
}

std::vector<std::string_view> split(std::string_view text, std::string_view at) {
  std::vector<std::string_view> parts;
  for (std::size_t end = text.find(at); end != std::string_view::npos; end = text.find(at)) {
    parts.push_back(trimmed(text.substr(0, end)));
    text.remove_prefix(end + at.size());
  }
  parts.push_back(trimmed(text));
  return parts;
}

bool take_front(std::string_view& text, std::string_view word) {
  if (!text.starts_with(word)) return false;
  text = trimmed(text.substr(word.size()));
  return true;
}

void refuse_stop(const SectionReader& section, std::string_view text) {
  section.problem("stop", fmt::format("'{}' is not a stop rule", text),
                  "write for example: after 6 h, or 3 readings within 5 %, or 8 h");
}

std::optional<models::StopWhenSteady> read_rule(const SectionReader& section, std::string_view text,
                                                Reading& reading) {
  const auto halves = split(text, " within ");
  const auto words = split(halves[0], " ");
  if (halves.size() != 2 || words.size() != 2 || words[1] != "readings") {
    refuse_stop(section, text);
    return std::nullopt;
  }
  const auto count =
      part(section, "stop", words[0], Dimension::fraction, {2, 20, "2 to 20 readings"}, reading);
  const auto within =
      part(section, "stop", halves[1], Dimension::fraction, {0.001, 0.5, "0.1 % to 50 %"}, reading);
  if (!count || !within) return std::nullopt;
  if (*count != static_cast<int>(*count)) {
    section.problem("stop", fmt::format("{} readings: a whole number is needed", words[0]));
    return std::nullopt;
  }
  return models::StopWhenSteady{static_cast<int>(*count), *within};
}

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
  } else if (value.ends_with(" full")) {
    value.remove_suffix(5);
    moisture.saturation = part(section, key, value, Dimension::fraction,
                               {0.001, 0.9999, "above 0 % and below 100 % full"}, reading);
  } else {
    section.problem(
        key, fmt::format("'{}' does not say a moisture", text),
        "write dry, moist, wet, or for example: suction 300 cm, content 25 %, 60 % full");
  }
  if (!moisture.suction && !moisture.water_content && !moisture.saturation) return std::nullopt;
  return moisture;
}

std::optional<StopWords> read_stop(const SectionReader& section, Reading& reading) {
  const auto text = section.text("stop");
  if (!text) return std::nullopt;
  auto alternatives = split(*text, " or ");
  if (alternatives.size() > 2) {
    section.problem("stop", fmt::format("'{}' has more than one 'or'", *text),
                    "write for example: 3 readings within 5 %, or 8 h");
    return std::nullopt;
  }
  StopWords stop;
  if (alternatives[0].find("reading") != std::string_view::npos) {
    if (alternatives[0].ends_with(',')) alternatives[0].remove_suffix(1);
    stop.rule = read_rule(section, alternatives[0], reading);
    if (!stop.rule) return std::nullopt;
    alternatives.erase(alternatives.begin());
  }
  if (alternatives.size() > 1) {
    section.problem("stop", fmt::format("'{}' names two times", *text), "keep one");
    return std::nullopt;
  }
  if (alternatives.empty()) return stop;
  take_front(alternatives[0], "after ");
  if (!alternatives[0].empty() && std::isalpha(static_cast<unsigned char>(alternatives[0][0]))) {
    refuse_stop(section, *text);
    return std::nullopt;
  }
  stop.longest = section.quantity_in("stop", alternatives[0]);
  if (!stop.longest) return std::nullopt;
  return stop;
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
