#include "cases/input/read_protocol.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/input/build_program.hpp"
#include "cases/input/read_gauge.hpp"
#include "cases/input/read_incident.hpp"
#include "cases/input/read_phrases.hpp"
#include "cases/input/read_stop.hpp"
#include "cases/input/read_supply.hpp"

namespace ringwright::cases {
namespace {

using Stages = std::vector<StageWords>;

constexpr double default_longest = 8 * 3600.0;

std::string time_text(double seconds) {
  if (seconds >= 2 * 3600.0) return fmt::format("{:.4g} h", seconds / 3600);
  if (seconds >= 60.0) return fmt::format("{:.4g} min", seconds / 60);
  return fmt::format("{:.4g} s", seconds);
}

// Fills the rule. A test whose stages have durations ends with them unless it names a rule.
TimeAllowed apply_stop(const TestSection& section, const HeadWords& heads, Test& test,
                       Reading& reading) {
  const SectionReader& where = section.with("stop");
  const auto words = section.has("stop") ? read_stop(where, reading) : std::nullopt;
  const bool all_said =
      !heads.stages.empty() && std::all_of(heads.stages.begin(), heads.stages.end(),
                                           [](const StageWords& stage) { return stage.duration; });
  const std::string path = section.own.path_of("stop");
  TimeAllowed allowed{default_longest, {}, false};
  if (words) {
    test.rule = words->rule;
    allowed.is_given = words->longest.has_value();
    allowed.longest = words->longest.value_or(default_longest);
    if (allowed.is_given && section.own.has("stop")) allowed.own_place = where.value_place("stop");
    if (!allowed.is_given && !all_said) reading.assume(path, "at most 8 h");
  } else if (heads.is_simple) {
    test.rule = models::StopRule{};
    reading.assume(path, "stop = 3 readings within 5 %, or 8 h");
  } else if (!all_said) {
    reading.assume(path, "stop = after 8 h");
  }
  test.also_judge = read_also_judge(section.with("also judge"), reading);
  return allowed;
}

double shortest_stage(const Stages& stages, const Test& test) {
  double shortest = test.protocol.longest;
  for (const StageWords& words : stages) {
    if (!words.stage.soak) shortest = std::min(shortest, words.stage.duration);
  }
  return shortest;
}

void apply_read(const TestSection& section, const Stages& stages, Test& test, Reading& reading) {
  const SectionReader& own = section.own;
  const auto given = read_readings(section.with("read"), reading).value_or(ReadWords{});
  test.protocol.reading_interval = given.interval;
  if (!given.interval) {
    // A test or stage shorter than the minute of the default is one reading.
    const double interval =
        std::min(shortest_stage(stages, test), std::max(60.0, 0.05 * test.protocol.longest));
    test.protocol.reading_interval = interval;
    reading.assume(own.path_of("read"), fmt::format("read every {}", time_text(interval)));
  }
  if (!given.ruler)
    reading.assume(own.path_of("read"), fmt::format("ruler {:g} mm", 1e3 * test.ruler));
  if (!given.head_kept)
    reading.assume(own.path_of("read"), fmt::format("head kept to {:g} mm", 1e3 * test.head_kept));
  test.ruler = given.ruler.value_or(test.ruler);
  test.head_kept = given.head_kept.value_or(test.head_kept);
}

int readings_needed(const Test& test) {
  const bool agreement = test.rule && (test.rule->kind == models::StopKind::change_within_share ||
                                       test.rule->kind == models::StopKind::change_within_amount);
  return agreement ? test.rule->readings : 1;
}

void check_readings_fit(const TestSection& section, const Test& test, Reading& reading) {
  if (!section.has("read")) return;
  const int needed = readings_needed(test);
  const double interval = test.protocol.reading_interval.value_or(0.0);
  if (needed * interval <= test.protocol.longest * (1 + 1e-9)) return;
  const std::string message = fmt::format(
      "{}{} every {} take longer than the test", section.own.front_of("read"),
      needed == 1 ? "one reading" : fmt::format("{} readings", needed), time_text(interval));
  const std::string ends = fmt::format("the test ends after {}", time_text(test.protocol.longest));
  const char* hint = "read more often, or stop later";
  const Place place = section.with("read").value_place("read");
  if (section.has("stop"))
    reading.contradiction(place, message, section.with("stop").value_place("stop"), ends, hint);
  else
    reading.problem(place, fmt::format("{}; {}", message, ends), hint);
}

// Every stage that is read needs a reading of its own.
void check_stages_read(const TestSection& section, const Stages& stages, const Test& test,
                       Reading& reading) {
  if (!section.has("read") || stages.size() < 2) return;
  const double interval = test.protocol.reading_interval.value_or(0.0);
  for (const StageWords& words : stages) {
    if (words.stage.soak || interval <= words.stage.duration * (1 + 1e-9)) continue;
    reading.contradiction(section.with("read").value_place("read"),
                          fmt::format("{}a reading every {} is longer than a stage",
                                      section.own.front_of("read"), time_text(interval)),
                          words.duration_place,
                          fmt::format("a stage of {}", time_text(words.stage.duration)),
                          "read more often, or make the stage longer");
    return;
  }
}

void apply_alpha_star(const TestSection& section, Test& test, Reading& reading) {
  constexpr std::string_view key = "assumed alpha star";
  const auto alpha_star = read_alpha_star(section.with(key), key);
  test.assumed_alpha_star = alpha_star.value_or(test.assumed_alpha_star);
  if (!section.has(key))
    reading.assume(section.own.path_of(key),
                   fmt::format("alpha* {:g} 1/cm", test.assumed_alpha_star / 100));
}

// The share of the mean also stands in the protocol of a constant head.
void copy_share(Test& test) {
  if (test.rule && test.rule->kind == models::StopKind::change_within_share)
    test.protocol.stop = models::StopWhenSteady{test.rule->readings, test.rule->share};
}

}  // namespace

void read_protocol(const TestSection& section, const HeadWords& heads, Test& test,
                   Reading& reading) {
  const std::size_t before = reading.problems.size();
  read_supply(section, test, reading);
  const TimeAllowed allowed = apply_stop(section, heads, test, reading);
  test.protocol.longest = allowed.longest;
  const Stages stages = build_program(section, heads, allowed, test, reading);
  const bool lasts = !stages.empty() || reading.problems.size() == before;
  apply_read(section, stages, test, reading);
  apply_alpha_star(section, test, reading);
  copy_share(test);
  read_gauge(section, test, reading);
  read_incidents(section.own, test, reading);
  warn_of_small_reservoir(section, test, reading);
  if (!lasts) return;
  check_readings_fit(section, test, reading);
  check_stages_read(section, stages, test, reading);
}

}  // namespace ringwright::cases
