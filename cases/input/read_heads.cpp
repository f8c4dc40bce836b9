#include "cases/input/read_heads.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <cmath>

#include "cases/input/phrase_parts.hpp"

namespace ringwright::cases {
namespace {

const Range& times() {
  static const Range range{1.0, 3.6e6, "1 s to 1000 h; a stage of no duration yields no reading"};
  return range;
}

void repeat(HeadWords& words, int times_over) {
  const std::vector<StageWords> once = words.stages;
  for (int i = 1; i < times_over; ++i)
    words.stages.insert(words.stages.end(), once.begin(), once.end());
}

// "each for 20 min" or "2 times"
bool read_clause(const SectionReader& section, std::string_view key, std::string_view clause,
                 HeadWords& words, int& times_over, Reading& reading) {
  if (take_front(clause, "each for ")) {
    const auto duration = part(section, key, clause, Dimension::time, times(), reading);
    for (StageWords& stage : words.stages) {
      if (!stage.duration) stage.duration = duration;
    }
    return duration.has_value();
  }
  if (take_back(clause, " times")) {
    const auto count = count_part(section, key, clause, {1, 50, "1 to 50 times"}, reading);
    times_over = count.value_or(1);
    return count.has_value();
  }
  section.problem(key, fmt::format("'{}' is not understood", clause),
                  "write for example: 5 cm then 15 cm, each for 20 min, 2 times");
  return false;
}

void refuse_equal_heads(const SectionReader& section, std::string_view key, HeadWords& words,
                        const std::vector<std::string_view>& texts) {
  for (std::size_t i = 1; i < words.stages.size(); ++i) {
    const double before = words.stages[i - 1].stage.head, head = words.stages[i].stage.head;
    if (std::abs(head - before) > 1e-9) continue;
    section.problem(key,
                    fmt::format("'{} then {}': the second head is equal to the first",
                                split(texts[i - 1], " for ")[0], split(texts[i], " for ")[0]),
                    "two heads are read together only if they differ; for one head write  head: "
                    "5 cm");
    words.ok = false;
    return;
  }
}

// The grammar of `heads` and `pressure`. @param depth added to each
HeadWords read_sequence(const SectionReader& section, std::string_view key, double depth,
                        Reading& reading) {
  HeadWords words;
  const auto text = section.text(key);
  words.ok = text.has_value();
  if (!text) return words;
  const auto clauses = split(*text, ",");
  const auto values = split(clauses[0], " then ");
  for (const std::string_view value : values) {
    const auto halves = split(value, " for ");
    const auto head = section.quantity_in(key, halves[0]);
    words.ok = words.ok && head;
    StageWords stage = constant_stage(depth + head.value_or(0.0), section.value_place(key));
    stage.duration_place = section.value_place(key);
    if (halves.size() > 1) {
      stage.duration = part(section, key, halves[1], Dimension::time, times(), reading);
      words.ok = words.ok && stage.duration;
    }
    words.stages.push_back(stage);
  }
  if (words.ok) refuse_equal_heads(section, key, words, values);
  int times_over = 1;
  for (std::size_t i = 1; i < clauses.size(); ++i)
    words.ok = read_clause(section, key, clauses[i], words, times_over, reading) && words.ok;
  if (words.ok && times_over > 1 && words.stages.size() == 1) {
    section.problem(key, "one head a number of times is one head held longer",
                    "give two heads, such as 5 cm then 15 cm");
    words.ok = false;
  }
  if (words.ok && times_over > 1 && words.stages.size() > 1 &&
      std::abs(words.stages.front().stage.head - words.stages.back().stage.head) < 1e-9) {
    section.problem(key, "repeated, the last head is followed by an equal one",
                    "leave the last head out");
    words.ok = false;
  }
  repeat(words, times_over);
  return words;
}

HeadWords one_head(const SectionReader& section) {
  HeadWords words;
  const auto head = section.quantity("head");
  words.ok = head.has_value();
  words.is_simple = true;
  if (head) words.stages.push_back(constant_stage(*head, section.value_place("head")));
  return words;
}

HeadWords one_fall(const SectionReader& section, Reading& reading) {
  HeadWords words;
  const auto fall = read_fall(section, reading);
  words.ok = fall.has_value();
  if (fall) words.stages.push_back(*fall);
  return words;
}

// Which of the keys describes the test; the first if several do, which is reported.
std::string_view kind_of(const SectionReader& section, Reading& reading) {
  constexpr std::array<std::string_view, 4> keys{"head", "heads", "fall", "stages"};
  std::string_view found;
  for (const std::string_view key : keys) {
    if (!section.has(key)) continue;
    if (found.empty()) {
      found = key;
      continue;
    }
    const bool later = section.key_place(key).line >= section.key_place(found).line;
    const std::string_view second = later ? key : found, first = later ? found : key;
    reading.contradiction(
        section.key_place(second),
        fmt::format("{}the heads are already given by '{}'", section.front_of(second), first),
        section.key_place(first), "given here", "keep one; 'stages' can hold all of them in a row");
  }
  return found;
}

// Keys that would be read for nothing beside this kind of heads.
void refuse_strays(const SectionReader& section, std::string_view kind, const HeadWords& words,
                   Reading& reading) {
  if (kind.empty()) return;
  const auto refuse = [&](std::string_view key, std::string_view message, std::string_view hint) {
    if (section.has(key))
      reading.contradiction(section.key_place(key), section.front_of(key) + std::string(message),
                            section.key_place(kind), fmt::format("'{}' is given here", kind),
                            std::string(hint));
  };
  if (kind != "head")
    refuse("pressure", "a pressure goes with one 'head', the depth under the lid",
           "heads count from the soil: depth plus pressure");
  if (kind != "fall")
    refuse("refill below", "only a fall is filled up again",
           kind == "stages" ? "put it into the stage that falls" : "write  fall: from 20 cm");
  const bool falls = std::any_of(words.stages.begin(), words.stages.end(), [](const auto& stage) {
    return stage.stage.kind == models::StageKind::free_fall;
  });
  if (words.ok && !falls && !section.has("lid"))
    refuse("falls in", "no level falls in this test", "write  fall: from 20 cm");
  if (words.ok && words.stages.size() == 1 && !section.has("soak"))
    refuse("step down", "there is no step down", "leave it out");
}

HeadWords read_kind(const SectionReader& section, std::string_view kind, double depth,
                    Reading& reading) {
  if (kind == "head" && section.has("pressure"))
    return read_sequence(section, "pressure", depth, reading);
  if (kind == "heads") return read_sequence(section, kind, 0.0, reading);
  if (kind == "fall") return one_fall(section, reading);
  if (kind == "stages") return read_stages(section, reading);
  return one_head(section);
}

}  // namespace

StageWords constant_stage(double head, const Place& place) {
  StageWords words;
  words.stage.head = head;
  words.place = words.duration_place = place;
  return words;
}

std::optional<StageWords> read_soak(const SectionReader& section, Reading& reading) {
  const auto text = section.text("soak");
  if (!text) return std::nullopt;
  const auto halves = split(*text, " for ");
  if (halves.size() != 2) {
    section.problem("soak", fmt::format("'{}' does not say how long", *text),
                    "write for example: 5 cm for 30 min");
    return std::nullopt;
  }
  const auto head = section.quantity_in("soak", halves[0]);
  const auto duration = part(section, "soak", halves[1], Dimension::time, times(), reading);
  if (!head || !duration) return std::nullopt;
  StageWords words = constant_stage(*head, section.value_place("soak"));
  words.duration = duration;
  words.stage.soak = true;
  return words;
}

HeadWords read_heads(const SectionReader& section, double depth, Reading& reading) {
  const std::string_view kind = kind_of(section, reading);
  HeadWords words = read_kind(section, kind, depth, reading);
  refuse_strays(section, kind, words, reading);
  return words;
}

}  // namespace ringwright::cases
