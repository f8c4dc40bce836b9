#pragma once
#include <bit>
#include <cstdint>
#include <vector>

#include "postprocess/reading/answer.hpp"

namespace ringwright::postprocess {

/// The bits of every number of an answer, fields included, for equality to the last bit.
inline std::vector<std::uint64_t> bits_of(const Answer& a) {
  std::vector<std::uint64_t> bits;
  const auto add = [&](double x) { bits.push_back(std::bit_cast<std::uint64_t>(x)); };
  const auto add_figure = [&](const Figure& f) { add(f.value), add(f.error); };
  const auto add_reads = [&](const ReadsX& r) {
    add_figure(r.rate_as_kfs), add_figure(r.one_head), add_figure(r.one_head_own_lambda);
  };
  for (const models::Reading& r : a.record.readings)
    for (double x : {r.time, r.interval, r.volume, r.total_volume, r.head}) add(x);
  for (const LadderRow& r : a.ladder) {
    add(r.time), add_figure(r.rate), add_figure(r.soil_volume), add_figure(r.supply_volume);
    add_reads(r.reads), add_figure(r.above_steady), add(r.stops_here);
  }
  add_figure(a.steady_rate), add_reads(a.steady_reads);
  add_figure(a.wetted_depth), add_figure(a.wetted_beyond_wall);
  for (double x : {a.time_to_steady.time, a.peak_flow, a.filling_volume, a.initial_water_content,
                   a.initial_saturation, a.own_capillary_length, a.worst_relative_error,
                   a.balance_error, static_cast<double>(a.total_steps)})
    add(x);
  for (const models::Reading& r : a.as_read.readings)
    for (double x : {r.volume, r.total_volume, r.head}) add(x);
  for (const StageReading& s : a.stages) {
    add(s.from), add(s.to), add(s.head_from), add(s.head_to), add(s.rate_as_read);
    add_figure(s.rate), add_figure(s.soil_volume), add_figure(s.steady_rate);
  }
  for (const HeadPair& p : a.pairs) add_figure(p.kfs), add_figure(p.reads), add(p.kfs_as_read);
  for (const RuleVerdict& v : a.verdicts) {
    add(v.stop.value_or(-1.0));
    add_figure(v.rate), add_figure(v.above_steady), add_figure(v.supply_volume);
  }
  const auto add_water = [&](const WaterUse& w) {
    add_figure(w.soil), add_figure(w.supply);
    add(w.standing), add(w.evaporated), add(w.removed), add(w.peak_flow);
  };
  add_water(a.water);
  if (a.outer_water) add_water(*a.outer_water);
  if (a.outer) add_figure(a.outer->rate), add_figure(a.outer->steady_rate);
  for (const Flag& f : a.flags) add(static_cast<double>(f.kind)), add(f.value), add(f.limit);
  add(a.influence.depth), add(a.influence.known);
  for (const solver::Sample& s : a.run.samples)
    for (double x :
         {s.time, s.ring_volume, s.ring_flow, s.drainage_volume, s.seepage_volume, s.stored_volume})
      add(x);
  for (const solver::Snapshot& s : a.run.snapshots) {
    for (double h : s.head) add(h);
    for (double theta : s.water_content) add(theta);
  }
  return bits;
}

}  // namespace ringwright::postprocess
