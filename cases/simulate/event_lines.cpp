#include "cases/simulate/event_lines.hpp"

#include <fmt/format.h>

#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/stop_figures.hpp"

namespace ringwright::cases {
namespace {

using solver::Event;
using solver::EventKind;

constexpr int most_events = 8;  // on the screen; all are in the files

std::string_view event_words(EventKind kind) {
  switch (kind) {
    case EventKind::head_reached:
      return "the head set is reached";
    case EventKind::head_lost:
      return "the head begins to sag";
    case EventKind::emptied:
      return "the ring is empty";
    case EventKind::refilled:
      return "filled up again";
    case EventKind::reservoir_empty:
      return "the tank is empty";
    case EventKind::reservoir_brought:
      return "the next tank is there";
    case EventKind::surfaced:
      return "water wells up outside";
    case EventKind::test_ended:
      return "the test ends for want of water";
  }
  return "";
}

}  // namespace

std::string event_lines(const postprocess::Answer& answer) {
  const auto stop = stop_time(answer);
  std::string list;
  int count = 0;
  for (const Event& event : answer.run.events) {
    if (stop && event.time > *stop * (1 + 1e-9) && event.kind != EventKind::test_ended) continue;
    if (++count > most_events) continue;
    list += fmt::format("{}{} {}{}", list.empty() ? "" : "; ", time_text(event.time),
                        event.outer ? "outer ring: " : "", event_words(event.kind));
  }
  if (list.empty()) return "";
  if (count > most_events) list += fmt::format("; {} more in answer.json", count - most_events);
  return paragraph("On the way: " + list + ".", "  ", "    ");
}

std::string stages_left_out(const postprocess::Answer& answer) {
  const std::size_t all = answer.question.setup.program.stages.size();
  const std::size_t run = answer.stages.empty() ? 0 : answer.stages.back().stage + 1;
  if (run == 0 || run >= all || answer.ended_early) return "";
  return paragraph(
      fmt::format("! The stop comes in stage {} of {}: what follows is never run. Give "
                  "this test a stop of its own, at the end of its stages.",
                  run, all),
      "  ", "    ");
}

std::string influence_line(const postprocess::Answer& answer) {
  if (!answer.influence.known) return "";
  if (answer.influence.depth == 0.0) {
    return paragraph(
        "Even if all of the ground were twice as permeable the rate at the stop would move "
        "by less than 5 %.",
        "  ", "    ");
  }
  return paragraph(
      fmt::format("What lies deeper than {} hardly counts: twice as permeable it would "
                  "move the rate at the stop by less than 5 %.",
                  about_cm(answer.influence.depth)),
      "  ", "    ");
}

std::string reading_lines(const postprocess::Answer& answer) {
  std::string text;
  const auto& read = answer.as_read.readings;
  if (!read.empty() && read.size() == answer.record.readings.size()) {
    const double truly = answer.record.rate(read.size() - 1);
    const double seen = answer.as_read.rate(read.size() - 1);
    if (differ(truly, seen)) {
      text +=
          paragraph(fmt::format("Through this crew's gauge the last reading is {} mm/h where {} "
                                "went into the ground: read longer, finer, or several and "
                                "average.",
                                mm_per_hour(seen), mm_per_hour(truly)),
                    "  ", "    ");
    }
  }
  if (!answer.outer) return text;
  const double steady = answer.outer->steady_rate.value;
  return text +
         paragraph(fmt::format("Outer ring at the stop: {} mm/h over its own area{}.",
                               mm_per_hour(answer.outer->rate.value),
                               steady > 0.0 ? fmt::format(", steady {}", mm_per_hour(steady)) : ""),
                   "  ", "    ");
}

}  // namespace ringwright::cases
