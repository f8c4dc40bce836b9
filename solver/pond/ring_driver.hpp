#pragma once
/// Takes the water of one ring through its program: which condition holds at the soil surface,
/// when it changes, and where the water went.
///
/// Three modes, one per leg of the integration:
///   prescribed  the head is known, constant or on a straight ramp; the supply is what balances
///   standing    the level is an unknown: free fall, limited supply, supply gone
///   dry         no water; the surface under the ring is closed
///
/// Changes known beforehand (stages, ramps, spells without water) end a leg at their time. What
/// the level itself brings about (a threshold reached, the reservoir empty) is met by aiming the
/// next step at where it will happen by the slope of the last one.

#include <limits>
#include <vector>

#include "models/protocol/pond_program.hpp"
#include "solver/flow/flow_system.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::solver {

class RingDriver {
 public:
  struct Place {
    int patch = 0;       ///< of the ring's surface
    int pond = 0;        ///< index of its pond in the flow system
    bool outer = false;  ///< for the events
  };
  /// What passed since the leg began.
  struct LegTotals {
    double soil = 0.0, supply = 0.0, evaporated = 0.0;  ///< [m3]
  };

  /// @param vessel where the level moves @param pond_head held all the time by a program without
  /// stages [m]
  RingDriver(models::PondProgram program, const models::Vessel& vessel, double pond_head,
             const Place& place);

  /// Whether the level may ever be an unknown.
  static bool needs_pond(const models::PondProgram& program);

  /// Sets condition and feed for the leg that begins at t [s].
  void begin_leg(FlowSystem& flow, double t) const;
  /// A first step that does justice to the ramp the leg begins with [s]; 0: no ramp.
  double first_step() const;
  /// Head at the time last seen [m]; the pond starts its leg from it.
  double head() const { return level_; }

  /// Next time at which something is done that is known beforehand [s], later than t.
  double next_change(double t) const;
  /// When the level or the reservoir reaches what ends the leg, by the last step's slope [s];
  /// infinite: not at all.
  double expected_event() const { return expected_; }

  /// After a step to t. @param pond_head the unknown's value; only used while standing
  /// @return true when a new leg must begin
  bool see(double t, double pond_head, const LegTotals& leg);
  /// Ends the leg at t, the time seen last, and does what is due then; leg totals start anew.
  void turn(double t, double pond_head, const LegTotals& leg);

  /// The water at t within the leg. @param pond_head as in see()
  RingWater water(double t, double pond_head, const LegTotals& leg) const;

  const std::vector<Event>& events() const { return events_; }
  bool test_is_over() const { return over_; }
  bool is_standing() const { return mode_ == Mode::standing; }

 private:
  enum class Mode { prescribed, standing, dry };
  struct Ramp {
    double from = 0.0, to = 0.0;            // [s]
    double head_from = 0.0, head_to = 0.0;  // [m]
    bool removes = false;                   // water is taken out on the way down
  };

  const models::Stage& stage() const { return program_.stages[stage_]; }
  bool rate_is_limited() const { return program_.supply.largest_rate.has_value(); }
  bool has_water() const { return mode_ != Mode::dry; }
  bool is_fed() const { return filling_ || held_; }
  bool in_spell(double t) const;
  double head_at(double t) const;

  bool ramp_is_short() const;
  bool only_a_ramp_ends(double t) const;
  bool watch_level(double t);
  bool watch_reservoir(double t, double used);
  void expect(double t, double before, double now, double target);
  void change(double t);
  void follow_stage(double t);
  void ramp_to(double t, double head, double seconds, bool removes);
  void hold(double t);
  void stand(bool fed, double target);
  void dry_out(double t, bool spilt);
  void reservoir_is_empty(double t);
  void note(double t, EventKind kind, double value = 0.0);

  models::PondProgram program_;
  models::Vessel vessel_;
  Place place_;
  std::vector<double> starts_;  // of the stages [s]
  std::size_t stage_ = 0;
  Mode mode_ = Mode::dry;
  Ramp ramp_;
  double level_ = 0.0;   // head at the time last seen [m]
  double target_ = 0.0;  // head at which a fall or a filling ends [m]
  double leg_start_ = 0.0, seen_ = 0.0;
  double supply_back_ = 0.0;     // no supply before [s]
  double reservoir_used_ = 0.0;  // of the present filling, at the start of the leg [m3]
  double seen_used_ = 0.0;
  double expected_ = std::numeric_limits<double>::infinity();
  bool filling_ = false;  // standing, fed, not yet at the head set
  bool held_ = false;     // standing, fed, has been at the head set
  bool lost_ = false, spell_ = false, short_ = false, over_ = false;
  bool reservoir_due_ = false;
  RingWater base_;  // at the start of the leg
  std::vector<Event> events_;
};

}  // namespace ringwright::solver
