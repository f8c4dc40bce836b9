#include "cases/input/read_stop.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cctype>

#include "cases/input/phrase_parts.hpp"
#include "cases/input/suggestion.hpp"

namespace ringwright::cases {
namespace {

using models::StopKind;
using models::StopRule;

void refuse(const SectionReader& section, std::string_view key, std::string_view text) {
  section.problem(key, fmt::format("'{}' is not a stop rule", text),
                  "write for example: after 6 h, or 3 readings within 5 %, or 8 h");
}

// "6 mm/h" of "within 6 mm/h", as against "5 %" and "0.05"
bool is_amount(std::string_view text) { return text.find('/') != std::string_view::npos; }

std::optional<StopRule> agreement(const SectionReader& section, std::string_view key,
                                  std::string_view text, Reading& reading) {
  const auto halves = split(text, " within ");
  const auto words = split(halves[0], " ");
  if (halves.size() != 2 || words.size() != 2 || words[1] != "readings") {
    refuse(section, key, text);
    return std::nullopt;
  }
  const auto count = count_part(section, key, words[0], {2, 20, "2 to 20 readings"}, reading);
  const bool amount = is_amount(halves[1]);
  const auto within = amount ? part(section, key, halves[1], Dimension::speed,
                                    {1e-13, 1e-3, "1e-13 m/s to 1 mm/s"}, reading)
                             : part(section, key, halves[1], Dimension::fraction,
                                    {0.001, 0.5, "0.1 % to 50 %"}, reading);
  if (!count || !within) return std::nullopt;
  StopRule rule;
  rule.kind = amount ? StopKind::change_within_amount : StopKind::change_within_share;
  rule.readings = *count;
  (amount ? rule.amount : rule.share) = *within;
  return rule;
}

// A volume, not a time: "20 L".
std::optional<double> as_volume(std::string_view text, const Reading& reading) {
  try {
    return reading.units.read(text, Dimension::volume);
  } catch (const ValueError&) {
    return std::nullopt;
  }
}

std::optional<StopRule> limit(const SectionReader& section, std::string_view key,
                              std::string_view text, std::string_view whole, Reading& reading) {
  take_front(text, "after ");
  if (!text.empty() && std::isalpha(static_cast<unsigned char>(text[0]))) {
    refuse(section, key, whole);
    return std::nullopt;
  }
  StopRule rule;
  if (as_volume(text, reading)) {
    const auto volume =
        part(section, key, text, Dimension::volume, {1e-6, 1e3, "1 mL to 1000 m3"}, reading);
    rule.kind = StopKind::after_volume;
    rule.volume = volume.value_or(0.0);
    return volume ? std::optional(rule) : std::nullopt;
  }
  const auto time = section.quantity_in(key, text);
  rule.kind = StopKind::after_time;
  rule.time = time.value_or(0.0);
  return time ? std::optional(rule) : std::nullopt;
}

std::optional<StopRule> preset(std::string_view text) {
  for (const StopRule& rule : models::stop_rule_presets()) {
    if (normalised(rule.name) == normalised(text)) return rule;
  }
  return std::nullopt;
}

std::optional<StopRule> read_rule(const SectionReader& section, std::string_view key,
                                  std::string_view text, std::string_view whole, Reading& reading) {
  if (const auto known = preset(text)) return known;
  if (text.find("reading") != std::string_view::npos) return agreement(section, key, text, reading);
  return limit(section, key, text, whole, reading);
}

}  // namespace

std::optional<StopWords> read_stop(const SectionReader& section, Reading& reading) {
  const auto text = section.text("stop");
  if (!text) return std::nullopt;
  const auto alternatives = split(*text, " or ");
  if (alternatives.size() > 2) {
    section.problem("stop", fmt::format("'{}' has more than one 'or'", *text),
                    "write for example: 3 readings within 5 %, or 8 h");
    return std::nullopt;
  }
  StopWords stop;
  for (std::string_view alternative : alternatives) {
    if (alternative.ends_with(',')) alternative.remove_suffix(1);
    const auto rule = read_rule(section, "stop", alternative, *text, reading);
    if (!rule) return std::nullopt;
    const bool is_time = rule->kind == StopKind::after_time;
    if (is_time ? stop.longest.has_value() : stop.rule.has_value()) {
      section.problem("stop", fmt::format("'{}' names two {}", *text, is_time ? "times" : "rules"),
                      is_time ? "keep one" : "keep one; the other may stand under 'also judge'");
      return std::nullopt;
    }
    if (is_time) stop.longest = rule->time;
    // A preset keeps its name, be it a time.
    if (!is_time || (!rule->name.empty() && !stop.rule)) stop.rule = rule;
  }
  return stop;
}

std::vector<models::StopRule> read_also_judge(const SectionReader& section, Reading& reading) {
  constexpr std::string_view key = "also judge";
  std::vector<StopRule> rules;
  for (const LocatedNode* item : section.items(key)) {
    if (item->kind != LocatedNode::Kind::scalar || trimmed(item->text).empty()) {
      reading.problem(item->place, section.front_of(key) + "a stop rule is needed",
                      "for example  also judge: after 6 h");
      continue;
    }
    const std::string text(trimmed(item->text));
    if (const auto rule = read_rule(section, key, text, text, reading)) rules.push_back(*rule);
  }
  return rules;
}

}  // namespace ringwright::cases
