#include "cases/input/read_protocol.hpp"

#include <fmt/format.h>

#include <algorithm>

namespace ringwright::cases {
namespace {

constexpr double default_longest = 8 * 3600.0;

std::string time_text(double seconds) {
  if (seconds >= 2 * 3600.0) return fmt::format("{:.4g} h", seconds / 3600);
  if (seconds >= 60.0) return fmt::format("{:.4g} min", seconds / 60);
  return fmt::format("{:.4g} s", seconds);
}

void apply_stop(const SectionReader& section, const StopWords& given, bool is_given, Test& test,
                Reading& reading) {
  test.protocol.stop = given.rule;
  test.protocol.longest = given.longest.value_or(default_longest);
  if (!is_given) {
    test.protocol.stop = models::StopWhenSteady{};
    reading.assume(section.path_of("stop"), "stop = 3 readings within 5 %, or 8 h");
  } else if (!given.longest) {
    reading.assume(section.path_of("stop"), "at most 8 h");
  }
}

void apply_read(const SectionReader& section, const ReadWords& given, Test& test,
                Reading& reading) {
  const double longest = test.protocol.longest;
  test.protocol.reading_interval = given.interval;
  if (!given.interval) {
    // A test shorter than the minute of the default is one reading.
    const double interval = std::min(longest, std::max(60.0, 0.05 * longest));
    test.protocol.reading_interval = interval;
    reading.assume(section.path_of("read"), fmt::format("read every {}", time_text(interval)));
  }
  if (!given.ruler)
    reading.assume(section.path_of("read"), fmt::format("ruler {:g} mm", 1e3 * test.ruler));
  if (!given.head_kept)
    reading.assume(section.path_of("read"),
                   fmt::format("head kept to {:g} mm", 1e3 * test.head_kept));
  test.ruler = given.ruler.value_or(test.ruler);
  test.head_kept = given.head_kept.value_or(test.head_kept);
}

void check_readings_fit(const SectionReader& section, const ProtocolWords& own,
                        const ProtocolWords& common, const Test& test, Reading& reading) {
  if (!(own.read || common.read)) return;
  const models::ConstantHead& protocol = test.protocol;
  const int needed = protocol.stop ? protocol.stop->readings : 1;
  const double interval = protocol.reading_interval.value_or(0.0);
  if (needed * interval <= protocol.longest * (1 + 1e-9)) return;
  const Place read_place = own.read ? own.read_place : common.read_place;
  const std::string message = fmt::format(
      "{}{} every {} take longer than the test", section.front_of("read"),
      needed == 1 ? "one reading" : fmt::format("{} readings", needed), time_text(interval));
  const std::string ends = fmt::format("the test ends after {}", time_text(protocol.longest));
  const char* hint = "read more often, or stop later";
  if (own.stop || common.stop) {
    reading.contradiction(read_place, message, own.stop ? own.stop_place : common.stop_place, ends,
                          hint);
  } else {
    reading.problem(read_place, fmt::format("{}; {}", message, ends), hint);
  }
}

}  // namespace

ProtocolWords read_protocol(const SectionReader& section, Reading& reading) {
  ProtocolWords words;
  words.stop = read_stop(section, reading);
  words.read = read_readings(section, reading);
  words.assumed_alpha_star = read_alpha_star(section, "assumed alpha star");
  if (section.has("stop")) words.stop_place = section.value_place("stop");
  if (section.has("read")) words.read_place = section.value_place("read");
  return words;
}

void apply_protocol(const SectionReader& section, const ProtocolWords& own,
                    const ProtocolWords& common, Test& test, Reading& reading) {
  const auto& stop = own.stop ? own.stop : common.stop;
  const auto& read = own.read ? own.read : common.read;
  const auto& alpha_star =
      own.assumed_alpha_star ? own.assumed_alpha_star : common.assumed_alpha_star;
  apply_stop(section, stop.value_or(StopWords{}), stop.has_value(), test, reading);
  apply_read(section, read.value_or(ReadWords{}), test, reading);
  test.assumed_alpha_star = alpha_star.value_or(test.assumed_alpha_star);
  if (!alpha_star) {
    reading.assume(section.path_of("assumed alpha star"),
                   fmt::format("alpha* {:g} 1/cm", test.assumed_alpha_star / 100));
  }
  check_readings_fit(section, own, common, test, reading);
}

}  // namespace ringwright::cases
