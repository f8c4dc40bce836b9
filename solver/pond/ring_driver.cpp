#include "solver/pond/ring_driver.hpp"

#include <algorithm>
#include <cmath>

namespace ringwright::solver {
namespace {

constexpr double kForever = std::numeric_limits<double>::infinity();
constexpr double kReached = 1e-6;     // [m], a level has come to its target
constexpr double kSag = 2e-3;         // [m] below the head set: the supply does not keep up
constexpr double kSameVolume = 1e-6;  // relative, a reservoir is empty
constexpr double kSoonest = 1e-3;     // [s], no step is aimed at less
// Totals are not in the error test: a ramp whose water counts is entered with small steps.
constexpr double kShortRamp = 0.005;  // of the stage
constexpr double kStepOfShortRamp = 1.0, kStepOfRamp = 0.03;
constexpr double kResume = 1.0;  // [s], ramp from where a fall ended to the head held

}  // namespace

RingDriver::RingDriver(models::PondProgram program, const models::Vessel& vessel, double pond_head,
                       const Place& place)
    : program_(std::move(program)), vessel_(vessel), place_(place), level_(vessel.base_head) {
  if (program_.stages.empty()) program_.stages.push_back({.head = pond_head, .duration = kForever});
  double start = 0.0;
  for (const models::Stage& s : program_.stages) {
    starts_.push_back(start);
    start += s.duration;
  }
  base_.head = level_;
  spell_ = in_spell(0.0);
  if (!spell_) follow_stage(0.0);
}

bool RingDriver::needs_pond(const models::PondProgram& p) {
  if (p.supply.is_limited()) return true;
  for (std::size_t k = 0; k < p.stages.size(); ++k) {
    const models::Stage& s = p.stages[k];
    if (s.kind == models::StageKind::free_fall) return true;
    if (k > 0 && s.head < p.stages[k - 1].head && s.down == models::StepDown::fall) return true;
  }
  return false;
}

bool RingDriver::in_spell(double t) const {
  return std::any_of(program_.empty.begin(), program_.empty.end(),
                     [t](const models::EmptySpell& e) { return e.from <= t && t < e.to; });
}

double RingDriver::head_at(double t) const {
  if (t >= ramp_.to) return ramp_.head_to;
  return ramp_.head_from +
         (ramp_.head_to - ramp_.head_from) * (t - ramp_.from) / (ramp_.to - ramp_.from);
}

void RingDriver::begin_leg(FlowSystem& flow, double t) const {
  if (mode_ == Mode::dry) {
    flow.set_condition(place_.patch, {}, t);
  } else if (mode_ == Mode::standing) {
    PondFeed feed;
    feed.evaporation = program_.evaporation * vessel_.area;
    if (is_fed()) {
      feed.set_head = stage().head;
      feed.largest_rate = program_.supply.largest_rate.value_or(0.0);
    }
    flow.set_feed(place_.pond, feed);
    flow.set_condition(place_.patch, {Boundary::pond, {}, false}, t);
  } else if (t < ramp_.to) {
    flow.set_condition(
        place_.patch, {Boundary::head, [this](double time, double) { return head_at(time); }, true},
        t);
  } else {
    flow.set_condition(place_.patch, Condition::constant(Boundary::head, ramp_.head_to), t);
  }
}

double RingDriver::next_change(double t) const {
  double next = kForever;
  const auto consider = [&](double x) {
    if (x > t) next = std::min(next, x);
  };
  if (stage_ + 1 < starts_.size()) consider(starts_[stage_ + 1]);
  if (mode_ == Mode::prescribed) consider(ramp_.to);
  for (const models::EmptySpell& e : program_.empty) consider(e.from), consider(e.to);
  consider(supply_back_);
  return next;
}

RingWater RingDriver::water(double t, double pond_head, const LegTotals& leg) const {
  RingWater w = base_;
  w.soil += leg.soil;
  switch (mode_) {
    case Mode::dry:
      return w;
    case Mode::standing:
      w.head = pond_head;
      w.standing = vessel_.volume(pond_head);
      w.evaporated += leg.evaporated;
      w.supply += leg.supply;
      return w;
    case Mode::prescribed:
      break;
  }
  w.head = head_at(t);
  w.standing = vessel_.volume(w.head);
  if (w.head > vessel_.base_head)
    w.evaporated += program_.evaporation * vessel_.area * (t - leg_start_);
  if (ramp_.removes) w.removed += base_.standing - w.standing;
  w.supply = w.soil + w.standing + w.evaporated + w.removed;
  return w;
}

bool RingDriver::see(double t, double pond_head, const LegTotals& leg) {
  const RingWater now = water(t, pond_head, leg);
  const double before = level_;
  expected_ = kForever;
  if (mode_ == Mode::standing && !is_fed()) expect(t, before, pond_head, target_);
  if (filling_) expect(t, before, pond_head, target_ - 2 * feed_band);
  level_ = mode_ == Mode::dry ? vessel_.base_head : now.head;
  const bool scheduled = t >= next_change(seen_) && !only_a_ramp_ends(t);
  reservoir_due_ = watch_reservoir(t, reservoir_used_ + now.supply - base_.supply);
  seen_ = t;
  const bool level = watch_level(t);
  return scheduled || reservoir_due_ || level;
}

// Over a short ramp the water of a bend that is stepped across is nothing beside the stage's.
bool RingDriver::ramp_is_short() const {
  return ramp_.to - ramp_.from <= kShortRamp * stage().duration;
}

double RingDriver::first_step() const {
  if (mode_ != Mode::prescribed || !(ramp_.to > leg_start_)) return 0.0;
  return (ramp_is_short() ? kStepOfShortRamp : kStepOfRamp) * (ramp_.to - leg_start_);
}

// A ramp that ends at a head that stays: its bend is stepped on, but the leg goes on.
bool RingDriver::only_a_ramp_ends(double t) const {
  if (mode_ != Mode::prescribed || t != ramp_.to || short_ || rate_is_limited()) return false;
  if (stage().kind != models::StageKind::constant_head || !ramp_is_short()) return false;
  const bool stage_ends = stage_ + 1 < starts_.size() && t >= starts_[stage_ + 1];
  return !stage_ends && t != supply_back_ && in_spell(t) == spell_;
}

void RingDriver::turn(double t, double pond_head, const LegTotals& leg) {
  const RingWater now = water(t, pond_head, leg);
  reservoir_used_ += now.supply - base_.supply;
  base_ = now;
  base_.head = level_;
  leg_start_ = t;
  expected_ = kForever;
  if (reservoir_due_) reservoir_is_empty(t);
  reservoir_due_ = false;
  change(t);
}

// The straight line through the last step ends at the target.
void RingDriver::expect(double t, double before, double now, double target) {
  const double slope = (now - before) / (t - seen_);
  const double to_go = (target - now) / slope;
  if (t > seen_ && to_go > 0.0) expected_ = std::min(expected_, t + std::max(to_go, kSoonest));
}

// @return true when the level is where something has to be done
bool RingDriver::watch_level(double t) {
  if (mode_ != Mode::standing) return false;
  if (!is_fed()) return level_ <= target_ + kReached;
  const bool there = level_ >= stage().head - 2 * feed_band - kReached;
  if (filling_ && there) {
    note(t, EventKind::head_reached, stage().head);
    filling_ = false;
    held_ = true;
    return stage().kind == models::StageKind::free_fall;
  }
  if (held_ && !lost_ && level_ < stage().head - kSag) note(t, EventKind::head_lost, level_);
  if (held_) lost_ = level_ < stage().head - (lost_ ? 2 * feed_band + kReached : kSag);
  return false;
}

bool RingDriver::watch_reservoir(double t, double used) {
  const auto& volume = program_.supply.reservoir;
  if (!volume || t < supply_back_ || mode_ == Mode::dry) return false;
  if (used > seen_used_) expect(t, seen_used_, used, *volume);
  seen_used_ = used;
  return used >= *volume * (1 - kSameVolume);
}

void RingDriver::reservoir_is_empty(double t) {
  note(t, EventKind::reservoir_empty, *program_.supply.reservoir);
  short_ = false;
  reservoir_used_ = seen_used_ = 0.0;
  switch (program_.supply.when_empty) {
    case models::WhenEmpty::stop:
      over_ = true;
      note(t, EventKind::test_ended);
      break;
    case models::WhenEmpty::go_on:
      supply_back_ = kForever;
      break;
    case models::WhenEmpty::refill:
      supply_back_ = t + program_.supply.refill_time;
      break;
  }
  stand(false, vessel_.base_head);
}

// Everything that is due at t, in the order: spell, stage, supply, ramp, level.
void RingDriver::change(double t) {
  bool resume = false;
  const bool spell = in_spell(t);
  if (spell && !spell_) dry_out(t, true);
  resume = spell_ && !spell;
  spell_ = spell;
  while (stage_ + 1 < starts_.size() && t >= starts_[stage_ + 1]) ++stage_, resume = true;
  if (t == supply_back_ && t > 0.0) {
    note(t, EventKind::reservoir_brought);
    // a fall under way goes on
    resume = resume || stage().kind == models::StageKind::constant_head || !has_water();
  }
  if (spell_) return;
  if (resume) {
    follow_stage(t);
  } else if (mode_ == Mode::prescribed && t >= ramp_.to) {
    hold(t);
  } else if (mode_ == Mode::standing && held_ && stage().kind == models::StageKind::free_fall) {
    hold(t);
  } else if (mode_ == Mode::standing && !is_fed() && level_ <= target_ + kReached) {
    const bool refill = stage().refill_below && target_ == *stage().refill_below;
    if (refill) note(t, EventKind::refilled, stage().head);
    if (target_ <= vessel_.base_head)
      dry_out(t, false);
    else if (refill || t >= supply_back_)
      ramp_to(t, stage().head, refill ? stage().ramp : kResume, false);
    else
      stand(false, vessel_.base_head);
  }
}

void RingDriver::follow_stage(double t) {
  const models::Stage& s = stage();
  const bool above = has_water() && level_ > s.head;
  if (above && s.down != models::StepDown::fall) {
    ramp_to(t, s.head, s.ramp, true);
  } else if (above && s.kind == models::StageKind::constant_head) {
    held_ = rate_is_limited() && t >= supply_back_;
    filling_ = false;
    stand(held_, s.head);
  } else if (above) {
    stand(false, s.refill_below.value_or(vessel_.base_head));
  } else if (t < supply_back_) {
    if (has_water()) stand(false, vessel_.base_head);
  } else {
    // the ring is full when the test begins
    ramp_to(t, s.head, t == 0.0 ? 0.0 : s.ramp, false);
  }
}

// Up, by what the supply can do; down, by taking out.
void RingDriver::ramp_to(double t, double head, double seconds, bool removes) {
  if (rate_is_limited() && !removes) {
    if (mode_ == Mode::dry) base_.supply += vessel_.still_volume - base_.standing;
    filling_ = true;
    held_ = false;
    stand(true, head);
    base_.standing = vessel_.volume(level_);
    return;
  }
  double reach = head;
  if (const auto& volume = program_.supply.reservoir; volume && !removes && vessel_.area > 0.0) {
    const double most = base_.standing + *volume - reservoir_used_ - vessel_.still_volume;
    reach = std::min(head, vessel_.base_head + most / vessel_.area);
  }
  short_ = reach < head;
  mode_ = Mode::prescribed;
  filling_ = held_ = false;
  ramp_ = {t, t + seconds, level_, reach, removes};
  if (seconds > 0.0) return;
  const double change = vessel_.volume(reach) - base_.standing;
  (removes ? base_.removed : base_.supply) += removes ? -change : change;
  if (!removes) reservoir_used_ += change, seen_used_ = reservoir_used_;
  base_.standing += change;
  level_ = base_.head = reach;
  ramp_.removes = false;
  hold(t);
}

// At the head of the stage: held, or left to fall.
void RingDriver::hold(double t) {
  const models::Stage& s = stage();
  ramp_.removes = false;
  if (short_) {
    reservoir_is_empty(t);
  } else if (s.kind == models::StageKind::free_fall) {
    filling_ = held_ = false;
    stand(false, s.refill_below.value_or(vessel_.base_head));
  } else if (rate_is_limited()) {
    held_ = true;
    stand(t >= supply_back_, s.head);
  }
}

void RingDriver::stand(bool fed, double target) {
  mode_ = Mode::standing;
  if (!fed) filling_ = held_ = false;
  target_ = target;
}

void RingDriver::dry_out(double t, bool spilt) {
  if (spilt) base_.removed += base_.standing, base_.standing = 0.0;
  if (has_water()) note(t, EventKind::emptied);
  mode_ = Mode::dry;
  filling_ = held_ = false;
  level_ = base_.head = vessel_.base_head;
}

void RingDriver::note(double t, EventKind kind, double value) {
  events_.push_back({t, kind, place_.outer, value});
}

}  // namespace ringwright::solver
