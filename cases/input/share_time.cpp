#include "cases/input/share_time.hpp"

#include <fmt/format.h>

namespace ringwright::cases {
namespace {

std::string time_words(double seconds) {
  if (seconds >= 2 * 3600.0) return fmt::format("{:.4g} h", seconds / 3600);
  return seconds >= 60.0 ? fmt::format("{:.4g} min", seconds / 60)
                         : fmt::format("{:.4g} s", seconds);
}

struct Times {
  double soak = 0.0, said = 0.0;  ///< [s]
  int open = 0;                   ///< stages of no said duration
};

Times add_up(const std::vector<StageWords>& stages) {
  Times times;
  for (const StageWords& words : stages) {
    if (words.stage.soak)
      times.soak += words.duration.value_or(0.0);
    else if (words.duration)
      times.said += *words.duration;
    else
      ++times.open;
  }
  return times;
}

bool refuse(const std::string& front, const TimeAllowed& allowed, const StageWords& stage,
            const std::string& message, const std::string& hint, Reading& reading) {
  if (allowed.own_place)
    reading.contradiction(*allowed.own_place, front + message, stage.duration_place,
                          "the stages are given here", hint);
  else
    reading.problem(stage.duration_place, front + message, hint);
  return false;
}

}  // namespace

bool share_time(const SectionReader& own, const TimeAllowed& allowed,
                std::vector<StageWords>& stages, Test& test, Reading& reading) {
  for (const StageWords& words : stages) {
    if (!words.stage.soak || words.duration) continue;
    reading.problem(words.place, own.front() + "how long the soak lasts is not said",
                    "for example  for: 30 min");
    return false;
  }
  const Times times = add_up(stages);
  const double left = allowed.longest - times.said;
  const bool too_long = left < -1e-9 * allowed.longest;
  if (times.open > 0 && left <= 0) {
    return refuse(own.front(), allowed, stages.back(),
                  fmt::format("no time is left for {} of the stages within {}", times.open,
                              time_words(allowed.longest)),
                  "say how long each lasts, or let the test take longer", reading);
  }
  if (times.open == 0 && too_long && allowed.own_place) {
    return refuse(own.front(), allowed, stages.back(),
                  fmt::format("the test stops after {}, before its stages end, after {}",
                              time_words(allowed.longest), time_words(times.said)),
                  "stop later, or make the stages shorter", reading);
  }
  const double each = times.open > 0 ? left / times.open : 0.0;
  for (StageWords& words : stages) words.stage.duration = words.duration.value_or(each);
  // The last stage goes on where the test itself names a later end.
  if (times.open == 0 && allowed.own_place && left > 0) stages.back().stage.duration += left;
  if (times.open > 1)
    reading.assume(own.path_of("heads"),
                   fmt::format("each for {}, equal parts of the time", time_words(each)));
  double whole = 0.0;
  for (const StageWords& words : stages) whole += words.stage.duration;
  test.protocol.longest = whole;
  return true;
}

}  // namespace ringwright::cases
