#pragma once
/// When a crew stops, judged on the record as it is read.

#include <string>

namespace ringwright::models {

enum class StopKind {
  after_time,            ///< at `time`
  change_within_share,   ///< the last `readings` rates all lie within `share` of their mean
  change_within_amount,  ///< largest minus smallest of the last `readings` rates is at most
                         ///< `amount`
  after_volume           ///< `volume` has gone into the ground
};

struct StopRule {
  StopKind kind = StopKind::change_within_share;
  int readings = 3;
  double share = 0.05;         ///< [-]
  double amount = 0.0;         ///< [m/s]
  double volume = 0.0;         ///< [m3]
  double time = 0.0;           ///< [s]
  std::string name = {};       ///< of a preset; empty otherwise
  bool check_edition = false;  ///< a preset drawn from a standard: "check your edition"
};

}  // namespace ringwright::models
