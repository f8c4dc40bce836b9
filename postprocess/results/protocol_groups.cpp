#include "postprocess/results/protocol_groups.hpp"

#include <limits>
#include <string>

#include "postprocess/results/h5_table.hpp"
#include "postprocess/results/kind_names.hpp"

namespace ringwright::postprocess {
namespace {

using models::Reading;
using solver::Event;

void write_as_read(hid_t file, const models::Record& read) {
  const Table<Reading> table(file, "as_read", read.readings);
  table.column("interval", {"s", "length of the reading interval"},
               [](const Reading& row) { return row.interval; });
  table.column("volume", {"m3", "volume in the interval as read"},
               [](const Reading& row) { return row.volume; });
  table.column("total_volume", {"m3", "volume since the start as read"},
               [](const Reading& row) { return row.total_volume; });
  table.column("rate", {"m/s", "mean rate over the interval as read"},
               [&](const Reading& row) { return row.volume / (read.ring_area * row.interval); });
  table.column("head", {"m", "depth of the pond as read"},
               [](const Reading& row) { return row.head; });
}

void write_stages(hid_t file, const std::vector<StageReading>& stages) {
  using Row = StageReading;
  const Table<Row> table(file, "stages", stages, "stage", "stage as run");
  table.counts("program_stage", "index of the stage in the program",
               [](const Row& row) { return row.stage; });
  table.column("from", {"s", "begin of the stage"}, [](const Row& row) { return row.from; });
  table.column("to", {"s", "end of the stage, or the stop"}, [](const Row& row) { return row.to; });
  table.column("head_from", {"m", "head at its begin"},
               [](const Row& row) { return row.head_from; });
  table.column("head_to", {"m", "head at its end"}, [](const Row& row) { return row.head_to; });
  table.figure("rate", {"m/s", "mean infiltration rate over the last interval of the stage"},
               [](const Row& row) { return row.rate; });
  table.column("rate_as_read", {"m/s", "the same as read"},
               [](const Row& row) { return row.rate_as_read; });
  table.figure("soil_volume", {"m3", "volume into the soil in the stage"},
               [](const Row& row) { return row.soil_volume; });
  table.figure("steady_rate", {"m/s", "steady infiltration rate at the head of the stage"},
               [](const Row& row) { return row.steady_rate; });
  table.marks("soak", "1: wets the ground, is not read", [](const Row& row) { return row.soak; });
}

void write_pairs(hid_t file, const std::vector<HeadPair>& pairs) {
  const Table<HeadPair> table(file, "pairs", pairs, "pair", "pair of heads read together");
  table.counts("first", "its first stage as run", [](const HeadPair& row) { return row.first; });
  table.counts("second", "its second stage as run", [](const HeadPair& row) { return row.second; });
  table.figure("kfs", {"m/s", "Kfs by the two-head formula at test temperature"},
               [](const HeadPair& row) { return row.kfs; });
  table.figure("reads", {"1", "that Kfs over true Kfs"},
               [](const HeadPair& row) { return row.reads; });
  table.column("kfs_as_read", {"m/s", "Kfs by the two-head formula from the record as read"},
               [](const HeadPair& row) { return row.kfs_as_read; });
  table.marks("physical", "1: Kfs and matric flux potential above 0",
              [](const HeadPair& row) { return row.physical; });
  table.marks("physical_as_read", "1: the same from the record as read",
              [](const HeadPair& row) { return row.physical_as_read; });
}

void write_verdicts(hid_t file, const std::vector<RuleVerdict>& verdicts) {
  using Row = RuleVerdict;
  const Table<Row> table(file, "verdicts", verdicts, "rule", "stop rule, the governing one first");
  table.texts("kind", "kind of rule", [](const Row& row) { return kind_name(row.rule.kind); });
  table.texts("name", "name of a preset", [](const Row& row) { return row.rule.name; });
  table.counts("readings", "readings it looks at",
               [](const Row& row) { return row.rule.readings; });
  table.column("share", {"1", "largest change as a share"},
               [](const Row& row) { return row.rule.share; });
  table.column("amount", {"m/s", "largest change"}, [](const Row& row) { return row.rule.amount; });
  table.column("volume", {"m3", "volume it ends at"},
               [](const Row& row) { return row.rule.volume; });
  table.column("after", {"s", "time it ends at"}, [](const Row& row) { return row.rule.time; });
  table.marks("met", "1: the rule ends the test",
              [](const Row& row) { return row.stop.has_value(); });
  table.column("stop", {"s", "when the rule ends the test, NaN: not met"}, [](const Row& row) {
    return row.stop.value_or(std::numeric_limits<double>::quiet_NaN());
  });
  table.figure("rate", {"m/s", "true mean infiltration rate of the last reading then"},
               [](const Row& row) { return row.rate; });
  table.figure("above_steady", {"1", "that rate over steady rate, minus 1"},
               [](const Row& row) { return row.above_steady; });
  table.figure("supply_volume", {"m3", "volume drawn from the supply then"},
               [](const Row& row) { return row.supply_volume; });
}

void write_flags(hid_t file, const std::vector<Flag>& flags) {
  const Table<Flag> table(file, "flags", flags, "flag", "what the crew must know");
  table.texts("kind", "what it is about", [](const Flag& row) { return kind_name(row.kind); });
  table.texts("value_unit", "unit of the value",
              [](const Flag& row) { return units_of(row.kind).value; });
  table.texts("limit_unit", "unit of the limit",
              [](const Flag& row) { return units_of(row.kind).limit; });
  table.texts("place_unit", "unit of the place",
              [](const Flag& row) { return units_of(row.kind).place; });
  table.column("value", {"1", "its number, in the unit of value_unit"},
               [](const Flag& row) { return row.value; });
  table.column("limit", {"1", "its limit, in the unit of limit_unit"},
               [](const Flag& row) { return row.limit; });
  table.column("place", {"1", "a further number, in the unit of place_unit"},
               [](const Flag& row) { return row.place; });
  table.marks("outer", "1: of the outer ring", [](const Flag& row) { return row.outer; });
}

void write_events(hid_t file, const std::vector<Event>& events) {
  const Table<Event> table(file, "events", events);
  table.texts("kind", "what happened", [](const Event& row) { return kind_name(row.kind); });
  table.texts("value_unit", "unit of the value",
              [](const Event& row) { return unit_of(row.kind); });
  table.column("value", {"1", "its number, in the unit of value_unit"},
               [](const Event& row) { return row.value; });
  table.marks("outer", "1: in the outer ring", [](const Event& row) { return row.outer; });
}

// Scalars that begin with `front`.
void put_water(hid_t group, const std::string& front, const std::string& whose,
               const WaterUse& water) {
  const auto put = [&](const char* name, double value, const Label& label) {
    write_scalar(group, front + name, value, {label.units, label.long_name + whose});
  };
  put("soil", water.soil.value, {"m3", "volume into the soil until the stop"});
  put("soil_error", water.soil.error, {"m3", "numerical error of: volume into the soil"});
  put("supply", water.supply.value, {"m3", "volume given by the supply until the stop"});
  put("supply_error", water.supply.error, {"m3", "numerical error of: volume given by the supply"});
  put("standing", water.standing, {"m3", "volume standing at the stop"});
  put("evaporated", water.evaporated, {"m3", "volume evaporated"});
  put("removed", water.removed, {"m3", "volume bailed, bled or spilt"});
  put("peak_flow", water.peak_flow, {"m3/s", "largest mean over 60 s of what the supply gives"});
}

void write_water(hid_t file, const Answer& answer) {
  const auto group = create_group(file, "water");
  put_water(group.id(), "ring_", ", of the (inner) ring", answer.water);
  put_water(group.id(), "outer_ring_", ", of the outer ring",
            answer.outer_water.value_or(WaterUse{}));
  const OuterReading outer = answer.outer.value_or(OuterReading{});
  write_scalar(group.id(), "outer_ring_rate", outer.rate.value,
               {"m/s", "mean rate of the outer ring over the last interval"});
  write_scalar(group.id(), "outer_ring_steady_rate", outer.steady_rate.value,
               {"m/s", "steady rate of the outer ring"});
}

}  // namespace

void write_protocol_groups(hid_t file, const Answer& answer) {
  write_as_read(file, answer.as_read);
  write_stages(file, answer.stages);
  write_pairs(file, answer.pairs);
  write_verdicts(file, answer.verdicts);
  write_flags(file, answer.flags);
  write_events(file, answer.run.events);
  write_water(file, answer);
}

}  // namespace ringwright::postprocess
