#include "postprocess/results/kind_names.hpp"

namespace ringwright::postprocess {

using solver::EventKind;

const char* kind_name(FlagKind kind) {
  switch (kind) {
    case FlagKind::supply_exceeded:
      return "supply exceeded";
    case FlagKind::reservoir_emptied:
      return "reservoir emptied";
    case FlagKind::ring_emptied:
      return "ring emptied";
    case FlagKind::flow_below_gauge:
      return "flow below gauge";
    case FlagKind::surfacing:
      return "surfacing";
    case FlagKind::piping:
      return "piping";
    case FlagKind::fracture:
      return "fracture";
    case FlagKind::evaporation_share:
      return "evaporation share";
    case FlagKind::stop_rule_not_met:
      return "stop rule not met";
    case FlagKind::domain_reached:
      return "domain reached";
    case FlagKind::insertion_share:
      return "insertion share";
    case FlagKind::sealed_temperature:
      return "sealed temperature";
    case FlagKind::lid_lift:
      return "lid lift";
    case FlagKind::lid_not_for_use:
      return "not for use";
  }
  return "";
}

const char* kind_name(models::StopKind kind) {
  switch (kind) {
    case models::StopKind::after_time:
      return "after time";
    case models::StopKind::change_within_share:
      return "change within share";
    case models::StopKind::change_within_amount:
      return "change within amount";
    case models::StopKind::after_volume:
      return "after volume";
  }
  return "";
}

const char* kind_name(EventKind kind) {
  switch (kind) {
    case EventKind::head_reached:
      return "head reached";
    case EventKind::head_lost:
      return "head lost";
    case EventKind::emptied:
      return "emptied";
    case EventKind::refilled:
      return "refilled";
    case EventKind::reservoir_empty:
      return "reservoir empty";
    case EventKind::reservoir_brought:
      return "reservoir brought";
    case EventKind::surfaced:
      return "surfaced";
    case EventKind::test_ended:
      return "test ended";
  }
  return "";
}

FlagUnits units_of(FlagKind kind) {
  switch (kind) {
    case FlagKind::supply_exceeded:
    case FlagKind::lid_not_for_use:
      return {"m", "m", "1"};
    case FlagKind::reservoir_emptied:
      return {"s", "m3", "1"};
    case FlagKind::ring_emptied:
      return {"s", "1", "1"};
    case FlagKind::surfacing:
      return {"m3", "s", "m"};
    case FlagKind::domain_reached:
      return {"m", "1", "1"};
    case FlagKind::sealed_temperature:
      return {"m3", "m3", "1"};
    case FlagKind::lid_lift:
      return {"N", "N", "kg"};
    case FlagKind::flow_below_gauge:
    case FlagKind::piping:
    case FlagKind::fracture:
    case FlagKind::evaporation_share:
    case FlagKind::stop_rule_not_met:
    case FlagKind::insertion_share:
      break;
  }
  return {"1", "1", "1"};
}

const char* unit_of(EventKind kind) {
  switch (kind) {
    case EventKind::reservoir_empty:
      return "m3";
    case EventKind::surfaced:
    case EventKind::head_lost:
      return "m";
    default:
      return "1";
  }
}

}  // namespace ringwright::postprocess
