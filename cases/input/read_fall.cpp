#include <fmt/format.h>

#include "cases/input/phrase_parts.hpp"
#include "cases/input/read_heads.hpp"

namespace ringwright::cases {
namespace {

constexpr std::string_view key = "fall";

// What follows "from 20 cm": "to 5 cm", "for 1 h", both in this order.
bool read_ends(const SectionReader& section, std::string_view& head, StageWords& words,
               Reading& reading) {
  const auto by_time = split(head, " for ");
  const auto by_depth = split(by_time[0], " to ");
  head = by_depth[0];
  if (by_time.size() > 1) {
    words.duration =
        part(section, key, by_time[1], Dimension::time, {1.0, 3.6e6, "1 s to 1000 h"}, reading);
    if (!words.duration) return false;
  }
  if (by_depth.size() < 2) return true;
  words.fall_to =
      part(section, key, by_depth[1], Dimension::head, {0.0, 5.0, "0 cm to 5 m"}, reading);
  return words.fall_to.has_value();
}

bool refuse_rising(const SectionReader& section, const StageWords& words) {
  if (!words.fall_to || *words.fall_to < words.stage.head - 1e-9) return false;
  section.problem(key,
                  fmt::format("a fall from {:g} cm does not reach {:g} cm", 100 * words.stage.head,
                              100 * *words.fall_to),
                  "name the higher level first");
  return true;
}

// Of the section: in a test or in one of its stages.
bool read_refill(const SectionReader& section, StageWords& words, Reading& reading) {
  if (!section.has("refill below")) return true;
  const auto below = section.quantity("refill below");
  if (!below) return false;
  words.stage.refill_below = below;
  if (words.fall_to) {
    reading.contradiction(
        section.value_place("refill below"),
        section.front_of("refill below") + "a fall that ends at a level is not filled up again",
        section.value_place(key), "it ends here",
        "write  fall: from 20 cm to 10 cm, 3 times, or leave 'to' out");
    return false;
  }
  if (*below < words.stage.head - 1e-9) return true;
  reading.contradiction(section.value_place("refill below"),
                        section.front_of("refill below") + "not below the level it fills up to",
                        section.value_place(key), "the fall begins here");
  return false;
}

}  // namespace

std::optional<StageWords> read_fall(const SectionReader& section, Reading& reading) {
  const auto text = section.text(key);
  if (!text) return std::nullopt;
  const auto clauses = split(*text, ",");
  StageWords words;
  words.stage.kind = models::StageKind::free_fall;
  words.place = words.duration_place = section.value_place(key);
  std::string_view head = clauses[0];
  take_front(head, "from ");
  if (!read_ends(section, head, words, reading)) return std::nullopt;
  const auto from = section.quantity_in(key, head);
  if (!from) return std::nullopt;
  words.stage.head = *from;
  for (std::size_t i = 1; i < clauses.size(); ++i) {
    std::string_view clause = clauses[i];
    if (!take_back(clause, " times")) {
      section.problem(key, fmt::format("'{}' is not understood", clause),
                      "write for example: from 20 cm to 5 cm, 3 times");
      return std::nullopt;
    }
    const auto count = count_part(section, key, clause, {1, 50, "1 to 50 times"}, reading);
    if (!count) return std::nullopt;
    words.falls = *count;
  }
  if (words.falls > 1 && !words.fall_to) {
    section.problem(key, "how far it falls each time is not said",
                    "write for example: from 20 cm to 5 cm, 3 times");
    return std::nullopt;
  }
  if (refuse_rising(section, words) || !read_refill(section, words, reading)) return std::nullopt;
  if (words.falls > 1) words.stage.refill_below = words.fall_to;
  return words;
}

}  // namespace ringwright::cases
