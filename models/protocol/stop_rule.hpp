#pragma once
/// When a crew stops, judged on the record as it is read.

#include <span>
#include <string>

namespace ringwright::models {

enum class StopKind {
  after_time,            ///< at `time`
  change_within_share,   ///< the last `readings` rates all lie within `share` of their mean
  change_within_amount,  ///< largest minus smallest of the last `readings` rates is at most
                         ///< `amount`
  after_volume           ///< `volume` has gone into the ground
};

/// Time and volume count from the start of the first reading, so that a soak before it is not part
/// of the test it ends.
struct StopRule {
  StopKind kind = StopKind::change_within_share;
  int readings = 3;
  double share = 0.05;         ///< [-]
  double amount = 0.0;         ///< [m/s]
  double volume = 0.0;         ///< [m3]
  double time = 0.0;           ///< [s]
  std::string name = {};       ///< of a preset; empty otherwise
  bool check_edition = false;  ///< a preset drawn from a standard: "check your edition"
  std::string source = {};     ///< of a preset: where it comes from, and how surely
};

/// Rules in use, each under a name of its own in plain words. None is the text of a standard: what
/// an edition asks for besides (a longest time, a soak, a reading interval) is not in it.
/// A rule told as drops of the level is given here as the change of rate that the drop makes in
/// the interval its name tells; read at another interval it is another rule.
/// @checked tests/models/protocol/stop_rule_test.cpp
std::span<const StopRule> stop_rule_presets();

/// The preset of that name. @throws std::invalid_argument, naming all, for another
const StopRule& stop_rule_preset(const std::string& name);

}  // namespace ringwright::models
