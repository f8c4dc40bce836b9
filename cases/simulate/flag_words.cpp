#include "cases/simulate/flag_words.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "cases/simulate/printed_number.hpp"
#include "models/ring/lid_lift.hpp"

namespace ringwright::cases {
namespace {

using postprocess::Answer;
using postprocess::Flag;
using postprocess::FlagKind;

constexpr double standard_gravity = 9.80665;  // [m/s2], defined; one kgf in newtons

const models::SingleRing& ring_of(const Flag& flag, const Answer& answer) {
  const auto& setup = answer.question.setup;
  return flag.outer && setup.outer_ring ? *setup.outer_ring : setup.ring;
}

std::string limit_words(double limit) { return fmt::format("{:.3g}", limit); }

std::string of_outer(const Flag& flag) { return flag.outer ? "outer ring: " : ""; }

std::string stated(double head) { return head > 0.0 ? about_cm(head) : "not stated"; }

std::string lid_lift(const Flag& flag) {
  if (!std::isfinite(flag.place))
    return fmt::format(
        "the water lifts the lid with {} N ({} kgf) at the highest head set, and with more if the "
        "supply can reach more, which is not stated: no ballast can be named. State the relief",
        rounded(flag.value), rounded(flag.value / standard_gravity));
  return fmt::format(
      "the water can lift the lid with {} N ({} kgf), lid and ring weigh {} N. Lay on {} kg, as {} "
      "pieces of at most 20 kg; the clamps carry the lift too. Stay clear of the lid, bleed before "
      "unclamping",
      rounded(flag.value), rounded(flag.value / standard_gravity), rounded(flag.limit),
      rounded_up(flag.place), models::ballast_pieces(flag.place));
}

std::string not_for_use(const Flag& flag) {
  return fmt::format(
      "not for use: the highest head the supply can reach is {}, the rating of the lid is {}. Fit "
      "an overflow or a "
      "relief valve, have lid and clamps rated for it, and state both",
      stated(flag.value), stated(flag.limit));
}

std::string piping(const Flag& flag, const Answer& answer) {
  return fmt::format(
      "{}water may break out along the wall: head over twice the depth driven is {}, limit {}. "
      "Drive deeper, or keep the head below {} and raise it in steps",
      of_outer(flag), rounded(flag.value), limit_words(flag.limit),
      about_cm(2.0 * ring_of(flag, answer).insertion * flag.limit));
}

std::string fracture(const Flag& flag) {
  return fmt::format(
      "the water presses at the foot of the wall with {} times the weight of the soil above it "
      "(limit {}): the ground may lift or crack. Lower the head or drive deeper",
      rounded(flag.value), limit_words(flag.limit));
}

std::string insertion(const Flag& flag) {
  return fmt::format(
      "{}driven through {} of the liner's thickness, limit {}: it may leave a leak. Drive less "
      "deep "
      "or test on a pad; repair and record every hole",
      of_outer(flag), percent(flag.value), percent(flag.limit));
}

std::string surfacing(const Flag& flag, const Answer& answer) {
  const auto& setup = answer.question.setup;
  const double wall = setup.outer_ring ? setup.outer_ring->radius : setup.ring.radius;
  return fmt::format(
      "water wells up outside the ring from {}, as far as {} from the wall, {} L by the stop: it "
      "is "
      "in the reading but not in the ground below. Drive deeper or lower the head",
      time_text(flag.limit), about_cm(std::max(0.0, flag.place - wall)), litres(flag.value));
}

std::string supply(const Flag& flag) {
  return fmt::format(
      "{}the supply does not keep the head: it sags by up to {} of the {} set, and the rate with "
      "it. "
      "Bring a bigger hose or valve, or a smaller ring or lower head",
      of_outer(flag), about_cm(flag.value), about_cm(flag.limit));
}

std::string reservoir(const Flag& flag) {
  return fmt::format(
      "{}the tank of {} L is empty after {}. Bring a larger one or have the next "
      "ready by then",
      of_outer(flag), litres(flag.limit), time_text(flag.value));
}

std::string ring_emptied(const Flag& flag) {
  return fmt::format(
      "{}the ring has been empty since {}: the last reading is not a rate of the soil. Stop "
      "before, "
      "fill up at a threshold, or bring more water",
      of_outer(flag), time_text(flag.value));
}

std::string gauge(const Flag& flag, const Answer& answer) {
  const std::string what =
      fmt::format("the last reading is {} divisions of the gauge, {} are wanted",
                  rounded(flag.value), limit_words(flag.limit));
  if (!(flag.value > 0.0))
    return what + ". Nothing went into the ground in it: the ring was empty, or water came up";
  return what + fmt::format(". Use a finer gauge or read every {}",
                            about_time(answer.question.reading_interval * flag.limit / flag.value));
}

std::string evaporation(const Flag& flag) {
  return fmt::format(
      "evaporation is {} of what the soil takes in the last reading, limit {}. Cover "
      "the pond, or read a pan beside it and subtract",
      percent(flag.value), percent(flag.limit));
}

std::string rule_not_met(const Flag& flag) {
  const std::string excess = flag.value != 0.0
                                 ? fmt::format(": at the end the rate is {} {} steady",
                                               percent(flag.value < 0.0 ? -flag.value : flag.value),
                                               flag.value < 0.0 ? "below" : "above")
                                 : "";
  return "the stop rule is not met" + excess + ". Allow more time, or take the rate for what it is";
}

std::string sealed(const Flag& flag) {
  return fmt::format(
      "one degree warmer or colder changes the sealed water by {} mL, more than a "
      "tenth of its daily flow of {} mL. Shade or bury the ring, read at the same "
      "hour and the same water temperature",
      rounded(flag.value * 1e6), rounded(10 * flag.limit * 1e6));
}

}  // namespace

std::string flag_words(const Flag& flag, const Answer& answer) {
  switch (flag.kind) {
    case FlagKind::supply_exceeded:
      return supply(flag);
    case FlagKind::reservoir_emptied:
      return reservoir(flag);
    case FlagKind::ring_emptied:
      return ring_emptied(flag);
    case FlagKind::flow_below_gauge:
      return gauge(flag, answer);
    case FlagKind::surfacing:
      return surfacing(flag, answer);
    case FlagKind::piping:
      return piping(flag, answer);
    case FlagKind::fracture:
      return fracture(flag);
    case FlagKind::evaporation_share:
      return evaporation(flag);
    case FlagKind::stop_rule_not_met:
      return rule_not_met(flag);
    case FlagKind::domain_reached:
      return fmt::format(
          "water came to the edge of the largest ground computed, {} m deep: figures "
          "after that are in doubt. Ask for a shorter test",
          rounded(flag.value));
    case FlagKind::insertion_share:
      return insertion(flag);
    case FlagKind::sealed_temperature:
      return sealed(flag);
    case FlagKind::lid_lift:
      return lid_lift(flag);
    case FlagKind::lid_not_for_use:
      return not_for_use(flag);
  }
  return "";
}

}  // namespace ringwright::cases
