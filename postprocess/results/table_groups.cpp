#include "postprocess/results/table_groups.hpp"

#include <string>

#include "postprocess/reading/true_kfs.hpp"
#include "postprocess/results/h5_table.hpp"
#include "postprocess/results/h5_write.hpp"
#include "postprocess/results/supplied.hpp"

namespace ringwright::postprocess {
namespace {

using models::Reading;
using solver::RingWater;
using solver::Sample;

void put_figure(hid_t group, const std::string& name, const Figure& figure, const Label& label) {
  write_scalar(group, name, figure.value, label);
  write_scalar(group, name + "_error", figure.error,
               {label.units, "numerical error of: " + label.long_name});
}

void put_flag(hid_t group, const std::string& name, bool flag, const std::string& long_name) {
  write_scalar(group, name, std::int64_t{flag}, {"1", long_name});
}

void put_steady(hid_t group, const Answer& answer) {
  const ReadsX& reads = answer.steady_reads;
  put_figure(group, "steady_rate", answer.steady_rate, {"m/s", "steady infiltration rate"});
  put_figure(group, "steady_reads_rate_as_kfs", reads.rate_as_kfs,
             {"1", "steady rate taken as Kfs, over true Kfs"});
  put_figure(group, "steady_reads_one_head", reads.one_head,
             {"1", "one-head formula at the steady rate, over true Kfs"});
  put_figure(group, "steady_reads_one_head_own_lambda", reads.one_head_own_lambda,
             {"1",
              "one-head formula at the steady rate with the soil's own capillary length, "
              "over true Kfs"});
  write_scalar(group, "time_to_steady", answer.time_to_steady.time,
               {"s", "last time the flow is more than 5 % from steady"});
  put_flag(group, "time_to_steady_beyond", answer.time_to_steady.beyond,
           "1: not reached, time_to_steady is the limit looked at");
}

void put_soil(hid_t group, const Answer& answer) {
  write_scalar(group, "true_kfs", true_kfs(answer.question),
               {"m/s", "true Kfs at test temperature"});
  write_scalar(group, "viscosity_ratio", answer.question.viscosity_ratio,
               {"1", "viscosity at test temperature over that at 20 degC"});
  write_scalar(group, "initial_water_content", answer.initial_water_content,
               {"1", "initial volumetric water content"});
  write_scalar(group, "initial_effective_saturation", answer.initial_saturation,
               {"1", "initial effective saturation"});
  write_scalar(group, "own_capillary_length", answer.own_capillary_length,
               {"m", "capillary length of the soil"});
}

void put_extent(hid_t group, const Answer& answer) {
  write_scalar(group, "peak_flow", answer.peak_flow,
               {"m3/s", "largest mean soil intake over 60 s"});
  write_scalar(group, "filling_volume", answer.filling_volume,
               {"m3", "water standing in the ring"});
  put_figure(group, "wetted_depth", answer.wetted_depth, {"m", "wetted depth at the stop"});
  put_figure(group, "wetted_beyond_wall", answer.wetted_beyond_wall,
             {"m", "wetted distance outside the wall at the stop"});
  write_scalar(group, "depth_of_influence", answer.influence.depth,
               {"m", "depth below which doubling K moves the rate at the stop by less than 5 %"});
  put_flag(group, "depth_of_influence_known", answer.influence.known,
           "0: not looked for or deeper than the ground computed");
  put_flag(group, "surfaced", answer.run.surfacing.happened, "1: water welled up outside");
  write_scalar(group, "surfacing_time", answer.run.surfacing.first_time,
               {"s", "when water first welled up outside"});
  write_scalar(group, "surfacing_radius", answer.run.surfacing.farthest,
               {"m", "largest radius at which water welled up"});
  write_scalar(group, "surfacing_volume", answer.run.surfacing.volume,
               {"m3", "volume that welled up in the whole run"});
}

void put_quality(hid_t group, const Answer& answer) {
  put_flag(group, "stop_rule_met", answer.stop_rule_met,
           "1: ended by the stop rule; 0: at the longest time");
  put_flag(group, "ended_early", answer.ended_early,
           "1: the reservoir was empty and the test ended there");
  put_flag(group, "interrupted", answer.interrupted, "1: stopped by the user, results end early");
  put_flag(group, "accuracy_met", answer.accuracy_met,
           "1: every promised figure as exact as asked");
  write_scalar(group, "accuracy", answer.question.accuracy, {"1", "relative accuracy asked for"});
  write_scalar(group, "worst_relative_error", answer.worst_relative_error,
               {"1", "largest relative numerical error of the promised figures"});
  write_scalar(group, "balance_error", answer.balance_error,
               {"1", "water balance error over throughput"});
  write_scalar(group, "refinements", std::int64_t{answer.refinements},
               {"1", "refinements until the accuracy was met"});
}

// The water of one ring, in columns that begin with `front`.
void put_ring_water(const Table<Sample>& table, const std::string& front, const std::string& whose,
                    RingWater Sample::*water) {
  const auto column = [&](const char* name, const char* unit, const char* what,
                          double RingWater::*value) {
    table.column(front + "_" + name, {unit, what + (" " + whose)},
                 [&](const Sample& row) { return row.*water.*value; });
  };
  column("head", "m", "head at the soil surface, below 0 where no water stands,", &RingWater::head);
  column("soil_volume", "m3", "volume into the soil", &RingWater::soil);
  column("standing_volume", "m3", "volume standing in ring and vessel", &RingWater::standing);
  column("supply_volume", "m3", "volume given by the supply", &RingWater::supply);
  column("evaporated_volume", "m3", "volume evaporated", &RingWater::evaporated);
  column("removed_volume", "m3", "volume bailed, bled or spilt", &RingWater::removed);
}

}  // namespace

void write_totals_group(hid_t file, const std::vector<Sample>& samples) {
  const Table<Sample> table(file, "totals", samples);
  table.column("ring_volume", {"m3", "volume into the soil through the ring"},
               [](const Sample& row) { return row.ring_volume; });
  table.column("ring_flow", {"m3/s", "flow into the soil through the ring"},
               [](const Sample& row) { return row.ring_flow; });
  table.column("drainage_volume", {"m3", "volume out of the bottom"},
               [](const Sample& row) { return row.drainage_volume; });
  table.column("seepage_volume", {"m3", "volume out of the surface outside the ring"},
               [](const Sample& row) { return row.seepage_volume; });
  table.column("stored_volume", {"m3", "change of the water stored in the soil"},
               [](const Sample& row) { return row.stored_volume; });
  table.column("side_volume", {"m3", "volume out of the side"},
               [](const Sample& row) { return row.side_volume; });
  put_ring_water(table, "ring", "of the (inner) ring", &Sample::water);
  put_ring_water(table, "outer_ring", "of the outer ring", &Sample::outer_water);
}

void write_record_group(hid_t file, const Answer& answer) {
  const auto& record = answer.record;
  const Table<Reading> table(file, "record", record.readings);
  table.column("interval", {"s", "length of the reading interval"},
               [](const Reading& row) { return row.interval; });
  table.column("volume", {"m3", "volume into the soil in the interval"},
               [](const Reading& row) { return row.volume; });
  table.column("total_volume", {"m3", "volume into the soil since the start"},
               [](const Reading& row) { return row.total_volume; });
  table.column("supply_volume", {"m3", "volume drawn from the supply since the start"},
               [&](const Reading& row) { return supplied_until(answer, row); });
  table.column("rate", {"m/s", "mean infiltration rate over the interval"},
               [&](const Reading& row) { return row.volume / (record.ring_area * row.interval); });
  table.column("head", {"m", "depth of the pond"}, [](const Reading& row) { return row.head; });
}

void write_ladder_group(hid_t file, const std::vector<LadderRow>& ladder) {
  const Table<LadderRow> table(file, "ladder", ladder);
  table.figure("rate", {"m/s", "mean infiltration rate over the last interval"},
               [](const LadderRow& row) { return row.rate; });
  table.figure("soil_volume", {"m3", "volume into the soil"},
               [](const LadderRow& row) { return row.soil_volume; });
  table.figure("supply_volume", {"m3", "volume drawn from the supply"},
               [](const LadderRow& row) { return row.supply_volume; });
  table.figure("reads_rate_as_kfs", {"1", "rate taken as Kfs, over true Kfs"},
               [](const LadderRow& row) { return row.reads.rate_as_kfs; });
  table.figure("reads_one_head", {"1", "one-head formula with assumed alpha*, over true Kfs"},
               [](const LadderRow& row) { return row.reads.one_head; });
  table.figure("reads_one_head_own_lambda",
               {"1", "one-head formula with the soil's own capillary length, over true Kfs"},
               [](const LadderRow& row) { return row.reads.one_head_own_lambda; });
  table.figure("above_steady", {"1", "rate over steady rate, minus 1"},
               [](const LadderRow& row) { return row.above_steady; });
  table.marks("stops_here", "1: the stop rule ends the test here",
              [](const LadderRow& row) { return row.stops_here; });
}

void write_figures_group(hid_t file, const Answer& answer) {
  const auto group = create_group(file, "figures");
  put_soil(group.id(), answer);
  put_steady(group.id(), answer);
  put_extent(group.id(), answer);
  put_quality(group.id(), answer);
}

}  // namespace ringwright::postprocess
