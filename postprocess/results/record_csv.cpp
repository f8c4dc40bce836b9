#include "postprocess/results/record_csv.hpp"

#include <fmt/format.h>

namespace ringwright::postprocess {
namespace {

constexpr double seconds_per_hour = 3600.0;
constexpr double millilitres = 1e6;    // in 1 m3
constexpr double litres = 1e3;         // in 1 m3
constexpr double centimetres = 1e2;    // in 1 m
constexpr double mm_per_h = 3600.0e3;  // in 1 m/s

}  // namespace

std::string record_csv(const Answer& answer) {
  std::string table = "time_h,interval_s,volume_mL,total_volume_L,supply_L,rate_mm_per_h,head_cm\n";
  const auto& record = answer.record;
  for (std::size_t i = 0; i < record.readings.size(); ++i) {
    const auto& reading = record.readings[i];
    table += fmt::format("{:.12g},{:.12g},{:.12g},{:.12g},{:.12g},{:.12g},{:.12g}\n",
                         reading.time / seconds_per_hour, reading.interval,
                         reading.volume * millilitres, reading.total_volume * litres,
                         (reading.total_volume + answer.filling_volume) * litres,
                         record.rate(i) * mm_per_h, reading.head * centimetres);
  }
  return table;
}

}  // namespace ringwright::postprocess
