#include <algorithm>

#include "postprocess/reading/flags/flags.hpp"

namespace ringwright::postprocess {
namespace {

using solver::EventKind;

constexpr double kFilm = 1e-6;  // [m3], what is left where a pond has run dry

bool happens(const TestAsRead& test, EventKind kind, bool outer, double from, double to) {
  return std::any_of(test.run.events.begin(), test.run.events.end(), [&](const solver::Event& e) {
    return e.kind == kind && e.outer == outer && e.time >= from && e.time <= to;
  });
}

// How far below the head set the level was found at most, at the samples of a stage and when it
// began to sag; a filling that comes to its end does not count.
double head_lost(const TestAsRead& test, const PlannedStage& s, bool outer, double to) {
  double since = to;
  for (const solver::Event& e : test.run.events)
    if (e.kind == EventKind::head_reached && e.outer == outer && e.time >= s.from && e.time <= to)
      since = std::min(since, e.time);
  double lost = 0.0;
  for (const solver::Sample& sample : test.run.samples)
    if (sample.time >= since * (1 - 1e-9) && sample.time <= to * (1 + 1e-9))
      lost = std::max(lost, s.stage.head - (outer ? sample.outer_water : sample.water).head);
  for (const solver::Event& e : test.run.events)
    if (e.kind == EventKind::head_lost && e.outer == outer && e.time >= s.from && e.time <= to)
      lost = std::max(lost, s.stage.head - e.value);
  return lost;
}

void supply_exceeded(const TestAsRead& test, const models::PondProgram& program, bool outer,
                     std::vector<Flag>& flags) {
  if (!program.supply.largest_rate) return;
  std::optional<Flag> worst;
  double head_before = 0.0;
  for (const PlannedStage& s : stages_of(program, 0.0, test.question.setup.duration)) {
    const bool rises = s.stage.head > head_before;
    head_before = s.stage.head;
    if (s.from >= test.stop) break;
    const double to = std::min(s.to, test.stop);
    const bool lost = happens(test, EventKind::head_lost, outer, s.from, to);
    const bool reached = !rises || happens(test, EventKind::head_reached, outer, s.from, to);
    if (!lost && reached) continue;
    const double value = head_lost(test, s, outer, to);
    if (!worst || value > worst->value)
      worst = Flag{FlagKind::supply_exceeded, value, s.stage.head, 0.0, outer};
  }
  if (worst) flags.push_back(*worst);
}

void reservoir_emptied(const TestAsRead& test, bool outer, std::vector<Flag>& flags) {
  for (const solver::Event& e : test.run.events) {
    const bool counts = e.kind == EventKind::reservoir_empty && e.outer == outer;
    // a test that ends with its reservoir has its last reading before that
    const bool ends = test.run.ended < test.question.setup.duration * (1 - 1e-9);
    if (!counts || (e.time > test.stop && !ends)) continue;
    flags.push_back({FlagKind::reservoir_emptied, e.time, e.value, 0.0, outer});
    return;
  }
}

// A stage or the end of a spell without water may have filled the ring with no event of its own.
bool stands_again(const TestAsRead& test, bool outer, double since) {
  return std::any_of(test.run.samples.begin(), test.run.samples.end(),
                     [&](const solver::Sample& s) {
                       return s.time > since && s.time <= test.stop * (1 + 1e-9) &&
                              (outer ? s.outer_water : s.water).standing > kFilm;
                     });
}

// Empty at the stop, or before its last reading was over: a fall that ends on the bare ground at
// the stop itself has been read to its end.
void ring_emptied(const TestAsRead& test, bool outer, std::vector<Flag>& flags) {
  constexpr double kNever = -1.0;
  double since = kNever;
  for (const solver::Event& e : test.run.events) {
    if (e.outer != outer || e.time >= test.stop * (1 - 1e-9)) continue;
    const bool filled = e.kind == EventKind::refilled || e.kind == EventKind::head_reached ||
                        e.kind == EventKind::reservoir_brought;
    if (e.kind == EventKind::emptied) since = e.time;
    if (filled) since = kNever;
  }
  if (since == kNever || stands_again(test, outer, since)) return;
  flags.push_back({FlagKind::ring_emptied, since, 0.0, 0.0, outer});
}

}  // namespace

void supply_flags(const TestAsRead& test, std::vector<Flag>& flags) {
  const solver::TestSetup& setup = test.question.setup;
  supply_exceeded(test, setup.program, false, flags);
  reservoir_emptied(test, false, flags);
  ring_emptied(test, false, flags);
  if (!setup.outer_ring) return;
  supply_exceeded(test, setup.outer_program, true, flags);
  reservoir_emptied(test, true, flags);
  ring_emptied(test, true, flags);
}

}  // namespace ringwright::postprocess
