#include "postprocess/results/protocol_json.hpp"

#include "postprocess/results/json_figure.hpp"
#include "postprocess/results/kind_names.hpp"

namespace ringwright::postprocess {
namespace {

using nlohmann::json;

template <typename Row>
json list_of(const std::vector<Row>& rows, json (*one)(const Row&)) {
  json list = json::array();
  for (const Row& row : rows) list.push_back(one(row));
  return list;
}

json stage_json(const StageReading& stage) {
  return {{"stage", stage.stage},
          {"soak", stage.soak},
          {"from", quantity(stage.from, "s")},
          {"to", quantity(stage.to, "s")},
          {"head_from", quantity(stage.head_from, "m")},
          {"head_to", quantity(stage.head_to, "m")},
          {"rate", figure(stage.rate, "m/s")},
          {"rate_as_read", quantity(stage.rate_as_read, "m/s")},
          {"soil_volume", figure(stage.soil_volume, "m3")},
          {"steady_rate", figure(stage.steady_rate, "m/s")}};
}

json pair_json(const HeadPair& pair) {
  return {{"first", pair.first},
          {"second", pair.second},
          {"kfs", figure(pair.kfs, "m/s")},
          {"reads_x", figure(pair.reads, "1")},
          {"kfs_as_read", quantity(pair.kfs_as_read, "m/s")},
          {"physical", pair.physical},
          {"physical_as_read", pair.physical_as_read}};
}

json verdict_json(const RuleVerdict& verdict) {
  const models::StopRule& rule = verdict.rule;
  return {{"rule",
           {{"kind", kind_name(rule.kind)},
            {"name", rule.name},
            {"readings", rule.readings},
            {"share", quantity(rule.share, "1")},
            {"amount", quantity(rule.amount, "m/s")},
            {"volume", quantity(rule.volume, "m3")},
            {"time", quantity(rule.time, "s")},
            {"check_edition", rule.check_edition},
            {"source", rule.source}}},
          {"met", verdict.stop.has_value()},
          {"stop", verdict.stop ? quantity(*verdict.stop, "s") : json()},
          {"rate", figure(verdict.rate, "m/s")},
          {"above_steady", figure(verdict.above_steady, "1")},
          {"supply_volume", figure(verdict.supply_volume, "m3")}};
}

json flag_json(const Flag& flag) {
  const FlagUnits units = units_of(flag.kind);
  return {{"kind", kind_name(flag.kind)},
          {"value", quantity(flag.value, units.value)},
          {"limit", quantity(flag.limit, units.limit)},
          {"place", quantity(flag.place, units.place)},
          {"outer", flag.outer}};
}

json event_json(const solver::Event& event) {
  return {{"time", quantity(event.time, "s")},
          {"kind", kind_name(event.kind)},
          {"value", quantity(event.value, unit_of(event.kind))},
          {"outer", event.outer}};
}

json water_json(const WaterUse& water) {
  return {{"soil", figure(water.soil, "m3")},
          {"supply", figure(water.supply, "m3")},
          {"standing", quantity(water.standing, "m3")},
          {"evaporated", quantity(water.evaporated, "m3")},
          {"removed", quantity(water.removed, "m3")},
          {"peak_flow", quantity(water.peak_flow, "m3/s")}};
}

json surfacing_json(const solver::Surfacing& surfacing) {
  return {{"happened", surfacing.happened},
          {"first_time", quantity(surfacing.first_time, "s")},
          {"farthest", quantity(surfacing.farthest, "m")},
          {"volume", quantity(surfacing.volume, "m3")}};
}

}  // namespace

void add_protocol(json& all, const Answer& answer) {
  all["stages"] = list_of(answer.stages, stage_json);
  all["pairs"] = list_of(answer.pairs, pair_json);
  all["verdicts"] = list_of(answer.verdicts, verdict_json);
  all["flags"] = list_of(answer.flags, flag_json);
  all["events"] = list_of(answer.run.events, event_json);
  all["water"] = water_json(answer.water);
  all["outer_water"] = answer.outer_water ? water_json(*answer.outer_water) : json();
  all["outer_ring"] = answer.outer ? json{{"rate", figure(answer.outer->rate, "m/s")},
                                          {"steady_rate", figure(answer.outer->steady_rate, "m/s")}}
                                   : json();
  all["surfacing"] = surfacing_json(answer.run.surfacing);
  all["depth_of_influence"] =
      answer.influence.known ? quantity(answer.influence.depth, "m") : json();
  all["ended_early"] = answer.ended_early;
}

}  // namespace ringwright::postprocess
