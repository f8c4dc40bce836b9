#include "cases/input/build_program.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "cases/input/read_supply.hpp"
#include "cases/input/share_time.hpp"
#include "cases/input/step_down.hpp"

namespace ringwright::cases {
namespace {

using models::StageKind;
using models::StepDown;
using Stages = std::vector<StageWords>;

constexpr double usual_ramp = 5.0;

// Only a test that is one fall ends at a level: there the volume that has gone since the soak says
// so.
bool end_at_level(const SectionReader& own, const Stages& stages, Test& test, Reading& reading) {
  const auto ends = std::find_if(stages.begin(), stages.end(),
                                 [](const StageWords& words) { return words.fall_to.has_value(); });
  if (ends == stages.end()) return true;
  const auto soaks = std::count_if(stages.begin(), stages.end(),
                                   [](const StageWords& words) { return words.stage.soak; });
  if (static_cast<std::size_t>(soaks) + 1 < stages.size()) {
    reading.problem(ends->place,
                    own.front() + "only a test that is one single fall can end at a level",
                    "say how long this fall lasts, for example  from 20 cm for 1 h");
    return false;
  }
  models::StopRule rule;
  rule.kind = models::StopKind::after_volume;
  rule.volume = ends->falls * vessel_area(test) * (ends->stage.head - *ends->fall_to);
  if (test.rule) test.also_judge.insert(test.also_judge.begin(), *test.rule);
  test.rule = rule;
  return true;
}

// The order: soak first, and only first.
bool check_soaks(const SectionReader& own, const Stages& stages, Reading& reading) {
  bool proper = false;
  for (const StageWords& words : stages) {
    if (words.stage.soak && proper) {
      reading.problem(words.place, own.front() + "a soak comes before the test proper",
                      "put it first, or make it a stage with a head");
      return false;
    }
    proper = proper || !words.stage.soak;
  }
  if (proper || stages.empty()) return proper;
  reading.problem(stages.front().place, own.front() + "there is nothing after the soak",
                  "add a head or a fall");
  return false;
}

bool lowers(const StageWords& before, const StageWords& stage) {
  return stage.stage.head < before.stage.head - 1e-9 || before.stage.kind == StageKind::free_fall;
}

void check_step_down(const SectionReader& own, const Test& test, StepDown down,
                     const Place& stage_place, Reading& reading) {
  const bool named = own.has("step down");
  const Place place = named ? own.value_place("step down") : stage_place;
  if (down == StepDown::bleed && !test.lid)
    reading.problem(place, own.front() + "water is bled only from under a lid",
                    "in an open ring the level falls, or is bailed");
  if (down == StepDown::bail && test.lid)
    reading.problem(place, own.front() + "nobody bails under a lid", "let it fall, or bleed it");
  if (down == StepDown::fall && test.vessel == VesselKind::air)
    reading.problem(place, own.front() + "pressed by air, no level falls", "bleed it");
}

// Ramps and ways down, the stage's own before the test's before the default.
void fill_in(const SectionReader& own, const Test& test, Stages& stages, Reading& reading) {
  const auto ramp = own.quantity("ramp");
  const auto down = read_step_down(own);
  const StepDown usual = test.lid ? StepDown::bleed : StepDown::fall;
  bool assumed_down = false, assumed_ramp = false;
  for (std::size_t i = 0; i < stages.size(); ++i) {
    StageWords& words = stages[i];
    words.stage.ramp = words.ramp.value_or(ramp.value_or(usual_ramp));
    words.stage.down = words.down.value_or(down.value_or(usual));
    assumed_ramp = assumed_ramp || !(words.ramp || ramp);
    if (words.stage.kind == StageKind::free_fall && test.vessel == VesselKind::air)
      reading.problem(words.place, own.front() + "pressed by air, no level falls",
                      "name the standpipe it falls in");
    if (i == 0 || !lowers(stages[i - 1], words)) {
      if (words.down || down) check_step_down(own, test, words.stage.down, words.place, reading);
      continue;
    }
    check_step_down(own, test, words.stage.down, words.place, reading);
    assumed_down = assumed_down || !(words.down || down);
  }
  if (assumed_ramp) reading.assume(own.path_of("ramp"), "a change of head takes 5 s");
  if (assumed_down)
    reading.assume(own.path_of("step down"),
                   test.lid ? "to a lower head the water is bled"
                            : "to a lower head the level falls as the soil drinks");
}

void check_ramps(const SectionReader& own, const Stages& stages, Reading& reading) {
  for (const StageWords& words : stages) {
    if (words.stage.ramp < words.stage.duration) continue;
    reading.problem(words.duration_place,
                    own.front() + "the stage is over before its head is reached",
                    fmt::format("the change of head takes {:g} s: make the stage longer or the "
                                "ramp shorter",
                                words.stage.ramp));
    return;
  }
}

// One constant head and nothing that moves it: no stages are needed.
bool is_plain(const TestSection& section, const HeadWords& heads, const Test& test) {
  return heads.is_simple && heads.stages.size() == 1 && !section.own.has("soak") &&
         !section.own.has("ramp") && !section.own.has("incident") &&
         !test.program.supply.is_limited() && test.evaporation == 0.0 &&
         test.vessel == VesselKind::ring;
}

void fill_outer(const TestSection& section, Test& test, Reading& reading) {
  if (!test.outer_ring) return;
  const SectionReader& own = section.own;
  const auto head = own.quantity("outer head");
  if (!own.has("outer head")) {
    test.outer.stages = test.program.stages;
    reading.assume(own.path_of("outer head"), "water in the outer ring as in the inner");
    if (!test.lid) return;
    reading.problem(own.key_place("lid"),
                    own.front_of("lid") + "an open outer ring cannot follow the pressure",
                    "give its own  outer head");
    return;
  }
  models::Stage stage;
  stage.head = head.value_or(0.0);
  stage.duration = test.protocol.longest;
  stage.ramp = own.quantity("ramp").value_or(usual_ramp);
  test.outer.stages = {stage};
  if (test.sealed_volume && head && std::abs(*head - test.protocol.head) > 1e-9) {
    reading.contradiction(
        own.value_place("outer head"),
        own.front_of("outer head") + "a sealed inner ring takes on the head of the outer one",
        own.value_place(own.has("head") ? "head" : "sealed"), "another head in the sealed ring",
        "make the two equal");
  }
}

void fill_seal(const SectionReader& own, const HeadWords& heads, Test& test, Reading& reading) {
  if (!test.sealed_volume) return;
  if (!heads.is_simple)
    reading.problem(heads.stages.front().place,
                    own.front() + "a sealed inner ring is read at one constant head",
                    "give one  head");
  if (*test.sealed_volume > 0) return;
  test.sealed_volume = filling_volume(test, test.protocol.head);
  reading.assume(
      own.path_of("sealed volume"),
      fmt::format("{:.3g} L sealed in, the ring filled to its head", 1e3 * *test.sealed_volume));
}

}  // namespace

std::vector<StageWords> build_program(const TestSection& section, const HeadWords& heads,
                                      const TimeAllowed& allowed, Test& test, Reading& reading) {
  const SectionReader& own = section.own;
  Stages stages = heads.stages;
  const auto soak = read_soak(own, reading);
  if (soak) stages.insert(stages.begin(), *soak);
  if (!heads.ok || stages.empty()) return {};
  const auto first = std::find_if(stages.begin(), stages.end(),
                                  [](const StageWords& words) { return !words.stage.soak; });
  if (first != stages.end()) test.protocol.head = first->stage.head;
  const bool plain = is_plain(section, heads, test);
  if (!check_soaks(own, stages, reading) || !end_at_level(own, stages, test, reading)) return {};
  if (!share_time(own, allowed, stages, test, reading)) return {};
  if (!plain) {
    fill_in(own, test, stages, reading);
    check_ramps(own, stages, reading);
    for (const StageWords& words : stages) test.program.stages.push_back(words.stage);
  }
  fill_outer(section, test, reading);
  fill_seal(own, heads, test, reading);
  return stages;
}

}  // namespace ringwright::cases
