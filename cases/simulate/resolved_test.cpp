#include "cases/simulate/resolved_test.hpp"

namespace ringwright::cases {
namespace {

using nlohmann::json;

const char* name_of(models::StopKind kind) {
  switch (kind) {
    case models::StopKind::after_time:
      return "after time";
    case models::StopKind::after_volume:
      return "after volume";
    case models::StopKind::change_within_amount:
      return "change within amount";
    case models::StopKind::change_within_share:
      break;
  }
  return "change within share";
}

json rule_json(const models::StopRule& rule) {
  json result = {{"kind", name_of(rule.kind)}};
  if (rule.kind == models::StopKind::after_time) result["time"] = with_unit(rule.time, "s");
  if (rule.kind == models::StopKind::after_volume) result["volume"] = with_unit(rule.volume, "m3");
  if (rule.kind == models::StopKind::change_within_amount)
    result["amount"] = with_unit(rule.amount, "m/s");
  if (rule.kind == models::StopKind::change_within_share)
    result["share"] = with_unit(rule.share, "1");
  const bool readings = rule.kind == models::StopKind::change_within_amount ||
                        rule.kind == models::StopKind::change_within_share;
  if (readings) result["readings"] = rule.readings;
  if (!rule.name.empty()) result["preset"] = rule.name;
  return result;
}

// The share of the mean as it always stood, any rule beside it.
json stop_json(const Test& test) {
  json result = {{"longest", with_unit(test.protocol.longest, "s")}};
  if (test.protocol.stop) {
    result["readings"] = test.protocol.stop->readings;
    result["within"] = with_unit(test.protocol.stop->within, "1");
  }
  if (test.rule) result["rule"] = rule_json(*test.rule);
  for (const models::StopRule& rule : test.also_judge)
    result["also_judged"].push_back(rule_json(rule));
  return result;
}

json stage_json(const models::Stage& stage) {
  constexpr const char* down[] = {"fall", "bail", "bleed"};
  json result = {{"kind", stage.kind == models::StageKind::free_fall ? "fall" : "constant head"},
                 {"head", with_unit(stage.head, "m")},
                 {"duration", with_unit(stage.duration, "s")},
                 {"ramp", with_unit(stage.ramp, "s")},
                 {"step_down", down[static_cast<int>(stage.down)]},
                 {"soak", stage.soak}};
  if (stage.refill_below) result["refill_below"] = with_unit(*stage.refill_below, "m");
  return result;
}

json supply_json(const models::Supply& supply) {
  constexpr const char* when_empty[] = {"goes on", "stops", "refilled"};
  json result = json::object();
  if (supply.largest_rate) result["largest_rate"] = with_unit(*supply.largest_rate, "m3/s");
  if (!supply.reservoir) return result;
  result["reservoir"] = with_unit(*supply.reservoir, "m3");
  result["when_empty"] = when_empty[static_cast<int>(supply.when_empty)];
  result["refill_time"] = with_unit(supply.refill_time, "s");
  return result;
}

// What is not there has no key.
void add_program(const RingProgram& program, json& result) {
  for (const models::Stage& stage : program.stages) result["stages"].push_back(stage_json(stage));
  if (program.supply.is_limited()) result["supply"] = supply_json(program.supply);
  for (const models::EmptySpell& spell : program.empty)
    result["empty"].push_back(
        {{"from", with_unit(spell.from, "s")}, {"to", with_unit(spell.to, "s")}});
}

json outer_json(const Test& test) {
  json result = {{"ring_radius", with_unit(test.outer_ring->radius, "m")},
                 {"insertion", with_unit(test.outer_ring->insertion, "m")}};
  add_program(test.outer, result);
  return result;
}

json lid_json(const models::Lid& lid) {
  json result = {{"underside", with_unit(lid.underside, "m")},
                 {"weight", with_unit(lid.weight, "kg")},
                 {"by_air", lid.by_air}};
  if (lid.seal_radius) result["seal_radius"] = with_unit(*lid.seal_radius, "m");
  if (lid.relief_head) result["highest_head"] = with_unit(*lid.relief_head, "m");
  if (lid.rating) result["rating"] = with_unit(*lid.rating, "m");
  return result;
}

void add_vessel(const Test& test, json& result) {
  constexpr const char* names[] = {"ring", "standpipe", "tank", "air"};
  if (test.vessel == VesselKind::ring) return;
  result["vessel"] = {{"kind", names[static_cast<int>(test.vessel)]},
                      {"diameter", with_unit(test.vessel_diameter, "m")}};
}

json gauge_json(const Test& test) {
  return {{"volume_division", with_unit(test.reader.volume_division, "m3")},
          {"random_error", with_unit(test.reader.random_error, "m3")},
          {"seed", test.reader.seed}};
}

}  // namespace

json with_unit(double value, std::string_view unit) { return {{"value", value}, {"unit", unit}}; }

json resolved_test(const Test& test) {
  json result = {{"name", test.name},
                 {"ring_radius", with_unit(test.ring.radius, "m")},
                 {"insertion", with_unit(test.ring.insertion, "m")},
                 {"wall_thickness", with_unit(test.wall_thickness, "m")},
                 {"head", with_unit(test.protocol.head, "m")},
                 {"stop", stop_json(test)},
                 {"assumed_alpha_star", with_unit(test.assumed_alpha_star, "1/m")},
                 {"ruler", with_unit(test.ruler, "m")},
                 {"head_kept", with_unit(test.head_kept, "m")},
                 {"gauge", gauge_json(test)}};
  if (const auto interval = test.protocol.reading_interval) {
    result["reading_interval"] = with_unit(*interval, "s");
  }
  add_program(test.program, result);
  add_vessel(test, result);
  if (test.outer_ring) result["outer"] = outer_json(test);
  if (test.lid) result["lid"] = lid_json(*test.lid);
  if (test.sealed_volume) result["sealed_volume"] = with_unit(*test.sealed_volume, "m3");
  if (test.evaporation > 0) result["evaporation"] = with_unit(test.evaporation, "m/s");
  return result;
}

}  // namespace ringwright::cases
