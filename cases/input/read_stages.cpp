#include <fmt/format.h>

#include <array>
#include <cmath>

#include "cases/input/read_heads.hpp"
#include "cases/input/step_down.hpp"

namespace ringwright::cases {
namespace {

constexpr std::array<std::string_view, 3> kinds{"head", "fall", "soak"};

// Exactly one of head, fall, soak.
std::string_view kind_of(const SectionReader& stage, const Place& where, Reading& reading) {
  std::string_view found;
  for (const std::string_view kind : kinds) {
    if (!stage.has(kind)) continue;
    if (!found.empty()) {
      reading.contradiction(stage.key_place(kind),
                            fmt::format("{}a stage is one thing", stage.front_of(kind)),
                            stage.key_place(found), fmt::format("'{}' is given here", found),
                            "make two stages of it");
      return "";
    }
    found = kind;
  }
  if (found.empty())
    reading.problem(where, stage.front() + "a stage needs head, fall or soak",
                    "for example  - { head: 5 cm, for: 20 min }");
  return found;
}

std::optional<StageWords> read_kind(const SectionReader& stage, const Place& where,
                                    Reading& reading) {
  const std::string_view kind = kind_of(stage, where, reading);
  if (kind.empty()) return std::nullopt;
  if (kind == "fall") return read_fall(stage, reading);
  if (stage.has("refill below")) {
    reading.contradiction(stage.key_place("refill below"),
                          stage.front_of("refill below") + "only a fall is filled up again",
                          stage.key_place(kind), "a head that is held");
  }
  const auto head = stage.quantity(kind);
  if (!head) return std::nullopt;
  StageWords words = constant_stage(*head, stage.value_place(kind));
  words.stage.soak = kind == "soak";
  return words;
}

std::optional<StageWords> read_stage(const SectionReader& stage, const Place& where,
                                     Reading& reading) {
  auto words = read_kind(stage, where, reading);
  const auto duration = stage.quantity("for");
  const auto ramp = stage.quantity("ramp");
  const auto down = read_step_down(stage);
  if (!words) return std::nullopt;
  if (stage.has("for")) {
    words->duration = duration;
    words->duration_place = stage.value_place("for");
    if (!duration) return std::nullopt;
  }
  words->ramp = ramp;
  words->down = down;
  return words;
}

bool is_same_again(const StageWords& before, const StageWords& stage) {
  const auto held = models::StageKind::constant_head;
  return before.stage.kind == held && stage.stage.kind == held && !before.stage.soak &&
         !stage.stage.soak && std::abs(before.stage.head - stage.stage.head) < 1e-9;
}

}  // namespace

HeadWords read_stages(const SectionReader& section, Reading& reading) {
  HeadWords words;
  const std::vector<Key>& keys = section.grammar_of("stages").keys;
  int number = 0;
  for (const LocatedNode* item : section.items("stages")) {
    const std::string path = fmt::format("{}.{}", section.path_of("stages"), ++number);
    const SectionReader stage(*item, keys, path, item->place, reading);
    const auto read = stage.is_broken() ? std::nullopt : read_stage(stage, item->place, reading);
    words.ok = words.ok && read;
    if (!read) continue;
    if (!words.stages.empty() && is_same_again(words.stages.back(), *read)) {
      reading.contradiction(read->place, stage.front() + "the head is equal to the one before",
                            words.stages.back().place, "the stage before",
                            "make one longer stage of the two");
      words.ok = false;
    }
    words.stages.push_back(*read);
  }
  words.ok = words.ok && !words.stages.empty();
  return words;
}

}  // namespace ringwright::cases
