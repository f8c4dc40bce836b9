#include "postprocess/results/record_csv.hpp"

#include <fmt/format.h>

#include "postprocess/results/supplied.hpp"

namespace ringwright::postprocess {
namespace {

constexpr double seconds_per_hour = 3600.0;
constexpr double millilitres = 1e6;    // in 1 m3
constexpr double litres = 1e3;         // in 1 m3
constexpr double centimetres = 1e2;    // in 1 m
constexpr double mm_per_h = 3600.0e3;  // in 1 m/s

// The same reading as the crew has it; empty cells where there is none.
std::string as_read_cells(const models::Record& read, std::size_t i) {
  if (i >= read.readings.size()) return ",,,";
  return fmt::format(",{:.12g},{:.12g},{:.12g}", read.readings[i].volume * millilitres,
                     read.rate(i) * mm_per_h, read.readings[i].head * centimetres);
}

}  // namespace

std::string record_csv(const Answer& answer) {
  std::string table =
      "time_h,interval_s,volume_mL,total_volume_L,supply_L,rate_mm_per_h,head_cm,"
      "as_read_volume_mL,as_read_rate_mm_per_h,as_read_head_cm\n";
  const auto& record = answer.record;
  for (std::size_t i = 0; i < record.readings.size(); ++i) {
    const auto& reading = record.readings[i];
    table +=
        fmt::format("{:.12g},{:.12g},{:.12g},{:.12g},{:.12g},{:.12g},{:.12g}",
                    reading.time / seconds_per_hour, reading.interval, reading.volume * millilitres,
                    reading.total_volume * litres, supplied_until(answer, reading) * litres,
                    record.rate(i) * mm_per_h, reading.head * centimetres) +
        as_read_cells(answer.as_read, i) + "\n";
  }
  return table;
}

}  // namespace ringwright::postprocess
