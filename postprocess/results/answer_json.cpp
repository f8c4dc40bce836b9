#include "postprocess/results/answer_json.hpp"

#include <cmath>
#include <functional>
#include <string>

#include "postprocess/reading/true_kfs.hpp"
#include "postprocess/results/json_figure.hpp"
#include "postprocess/results/protocol_json.hpp"

namespace ringwright::postprocess {
namespace {

using nlohmann::json;

Figure scaled(const Figure& from, double factor) {
  return {from.value * factor, from.error * std::abs(factor)};
}

/// The three readings times a factor: 1 for "reads x", a Kfs for the Kfs reported.
json readings(const ReadsX& reads, double factor, const char* unit) {
  return {{"rate_as_kfs", figure(scaled(reads.rate_as_kfs, factor), unit)},
          {"one_head", figure(scaled(reads.one_head, factor), unit)},
          {"one_head_own_lambda", figure(scaled(reads.one_head_own_lambda, factor), unit)}};
}

/// Adds what a rate reads: over the true Kfs, and as Kfs.
void add_readings(json& row, const ReadsX& reads, const Question& question) {
  const double kfs = true_kfs(question);
  row["reads_x"] = readings(reads, 1.0, "1");
  row["reported_kfs"] = readings(reads, kfs, "m/s");
  row["reported_kfs_20degC"] = readings(reads, kfs * question.viscosity_ratio, "m/s");
}

json soil_json(const models::Soil& soil) {
  return {{"curves", soil.curves ? json(soil.curves->describe()) : json()},
          {"theta_r", quantity(soil.theta_r, "1")},
          {"theta_s", quantity(soil.theta_s, "1")},
          {"Ks", quantity(soil.Ks, "m/s")},
          {"specific_storage", quantity(soil.specific_storage, "1/m")}};
}

json question_json(const Question& question) {
  const auto& setup = question.setup;
  return {{"soil", soil_json(setup.soil)},
          {"initial_head", quantity(setup.initial_head, "m")},
          {"ring_radius", quantity(setup.ring.radius, "m")},
          {"ring_insertion", quantity(setup.ring.insertion, "m")},
          {"pond_head", quantity(setup.pond_head, "m")},
          {"longest", quantity(setup.duration, "s")},
          {"reading_interval", quantity(question.reading_interval, "s")},
          {"stop_readings", question.stop_readings},
          {"stop_within", quantity(question.stop_within, "1")},
          {"assumed_alpha_star", quantity(question.assumed_alpha_star, "1/m")},
          {"viscosity_ratio", quantity(question.viscosity_ratio, "1")},
          {"accuracy", quantity(question.accuracy, "1")}};
}

json record_json(const models::Record& record) {
  json rows = json::array();
  for (std::size_t i = 0; i < record.readings.size(); ++i) {
    const auto& reading = record.readings[i];
    rows.push_back({{"time", quantity(reading.time, "s")},
                    {"interval", quantity(reading.interval, "s")},
                    {"volume", quantity(reading.volume, "m3")},
                    {"total_volume", quantity(reading.total_volume, "m3")},
                    {"rate", quantity(record.rate(i), "m/s")},
                    {"head", quantity(reading.head, "m")}});
  }
  return {{"ring_area", quantity(record.ring_area, "m2")}, {"readings", rows}};
}

/// A long record takes least room by columns.
json column_json(const models::Record& record, const char* unit,
                 const std::function<double(std::size_t)>& of) {
  json values = json::array();
  for (std::size_t i = 0; i < record.readings.size(); ++i) values.push_back(of(i));
  return {{"unit", unit}, {"values", std::move(values)}};
}

json as_read_json(const models::Record& read) {
  const auto& rows = read.readings;
  return {{"time", column_json(read, "s", [&](std::size_t i) { return rows[i].time; })},
          {"interval", column_json(read, "s", [&](std::size_t i) { return rows[i].interval; })},
          {"volume", column_json(read, "m3", [&](std::size_t i) { return rows[i].volume; })},
          {"total_volume",
           column_json(read, "m3", [&](std::size_t i) { return rows[i].total_volume; })},
          {"rate", column_json(read, "m/s", [&](std::size_t i) { return read.rate(i); })},
          {"head", column_json(read, "m", [&](std::size_t i) { return rows[i].head; })}};
}

json ladder_json(const Answer& answer) {
  json rows = json::array();
  for (const auto& rung : answer.ladder) {
    json row = {{"time", quantity(rung.time, "s")},
                {"rate", figure(rung.rate, "m/s")},
                {"soil_volume", figure(rung.soil_volume, "m3")},
                {"supply_volume", figure(rung.supply_volume, "m3")},
                {"above_steady", figure(rung.above_steady, "1")},
                {"stops_here", rung.stops_here}};
    add_readings(row, rung.reads, answer.question);
    rows.push_back(std::move(row));
  }
  return rows;
}

json steady_json(const Answer& answer) {
  json steady = {{"rate", figure(answer.steady_rate, "m/s")},
                 {"time_to_steady", quantity(answer.time_to_steady.time, "s")},
                 {"time_to_steady_beyond", answer.time_to_steady.beyond}};
  add_readings(steady, answer.steady_reads, answer.question);
  return steady;
}

json truth_json(const Question& question) {
  const double kfs = true_kfs(question);
  return {{"kfs", quantity(kfs, "m/s")},
          {"kfs_20degC", quantity(kfs * question.viscosity_ratio, "m/s")}};
}

json numerics_json(const Answer& answer) {
  return {{"worst_relative_error", quantity(answer.worst_relative_error, "1")},
          {"accuracy_met", answer.accuracy_met},
          {"refinements", answer.refinements},
          {"balance_error", quantity(answer.balance_error, "1")},
          {"total_steps", answer.total_steps}};
}

}  // namespace

nlohmann::json to_json(const Answer& answer) {
  json all = {{"question", question_json(answer.question)},
              {"truth", truth_json(answer.question)},
              {"record", record_json(answer.record)},
              {"ladder", ladder_json(answer)},
              {"stop_rule_met", answer.stop_rule_met},
              {"steady", steady_json(answer)},
              {"peak_flow", quantity(answer.peak_flow, "m3/s")},
              {"filling_volume", quantity(answer.filling_volume, "m3")},
              {"wetted_depth", figure(answer.wetted_depth, "m")},
              {"wetted_beyond_wall", figure(answer.wetted_beyond_wall, "m")},
              {"initial_water_content", quantity(answer.initial_water_content, "1")},
              {"initial_effective_saturation", quantity(answer.initial_saturation, "1")},
              {"own_capillary_length", quantity(answer.own_capillary_length, "m")},
              {"numerics", numerics_json(answer)},
              {"interrupted", answer.interrupted}};
  all["as_read"] = as_read_json(answer.as_read);
  add_protocol(all, answer);
  return all;
}

nlohmann::json answer_document(const Answer& answer, const Provenance& provenance) {
  return {{"format", "ringwright-answer"},
          {"format_version", 1},
          {"answer", to_json(answer)},
          {"provenance", to_json(provenance)}};
}

}  // namespace ringwright::postprocess
