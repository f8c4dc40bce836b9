#include "cases/simulate/ladder_table.hpp"

#include <fmt/format.h>

#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {
namespace {

using postprocess::Answer;
using postprocess::LadderRow;
using postprocess::ReadsX;

std::string row(std::string_view mark, std::string_view time, double rate, std::string_view water,
                const ReadsX& reads, std::string_view above, std::string_view remark) {
  std::string line =
      fmt::format("  {:1} {:>10} {:>8} {:>8} {:>8}   {:>6} {:>8} {:>9} {:>10}", mark, time,
                  mm_per_hour(rate), inch_per_hour(rate), water, rounded(reads.rate_as_kfs.value),
                  rounded(reads.one_head.value), rounded(reads.one_head_own_lambda.value), above);
  if (!remark.empty()) line += fmt::format("  {}", remark);
  return line + "\n";
}

std::string_view stop_remark(const Answer& answer) {
  if (answer.question.stop_readings == 0) return "you stop here";
  return answer.stop_rule_met ? "your rule stops here" : "rule not met; you stop";
}

std::string_view heading() {
  return "      stop at    rate then        water   reads x, the true Kfs being 1     above\n"
         "                 mm/h     in/h        L     rate  formula  formula+    steady\n";
}

std::string notes(const Answer& answer) {
  return fmt::format(
      "    formula: one head, Reynolds & Elrick 1990, with the assumed alpha* {:g} 1/cm\n"
      "    formula+: the same with this soil's own capillary length, {}: not available to a crew\n"
      "    water with the {} L that fill the ring; above steady: not yet steady by so much\n",
      answer.question.assumed_alpha_star / 100.0, about_cm(answer.own_capillary_length),
      litres(answer.filling_volume));
}

std::string kfs_row(std::string_view name, double Kfs, double viscosity_ratio, double factor,
                    bool two_temperatures, std::string_view remark = "") {
  std::string line =
      fmt::format("    {:32} {:>8} {:>8}", name, mm_per_hour(Kfs), inch_per_hour(Kfs));
  if (two_temperatures) {
    line += fmt::format("   {:>8} {:>8}", mm_per_hour(Kfs * viscosity_ratio),
                        inch_per_hour(Kfs * viscosity_ratio));
  }
  line += fmt::format("   {:>7}", rounded(factor));
  if (!remark.empty()) line += fmt::format("  {}", remark);
  return line + "\n";
}

std::string kfs_heading(double stop_time, double temperature, bool two_temperatures) {
  const std::string title = fmt::format("Kfs from the reading at {}", time_text(stop_time));
  const std::string at_test = fmt::format("at {:g} degC", temperature);
  if (!two_temperatures) {
    return fmt::format("  {:34} {:>17}   reads x\n{:45}mm/h     in/h\n", title, at_test, "");
  }
  return fmt::format("  {:34} {:>17}   {:>17}   reads x\n{:41}mm/h     in/h {:>10} {:>8}\n", title,
                     at_test, "at 20 degC", "", "mm/h", "in/h");
}

}  // namespace

std::string ladder_table(const Answer& answer) {
  std::string text(heading());
  for (const LadderRow& at : answer.ladder) {
    text += row(at.stops_here ? ">" : "", time_text(at.time), at.rate.value,
                litres(at.supply_volume.value), at.reads, percent(at.above_steady.value),
                at.stops_here ? stop_remark(answer) : "");
  }
  if (answer.steady_rate.value > 0.0) {
    text += row("", "never", answer.steady_rate.value, "-", answer.steady_reads, "0 %", "");
  }
  return text + notes(answer);
}

std::string reading_table(const Answer& answer, double temperature) {
  const LadderRow* stop = stop_of(answer);
  if (stop == nullptr) return "";
  const double Kfs = answer.question.setup.soil.Ks;
  const double ratio = answer.question.viscosity_ratio;
  const bool two = temperature != 20.0;
  const ReadsX& reads = stop->reads;
  const auto line = [&](std::string_view name, double factor, std::string_view remark = "") {
    return kfs_row(name, factor * Kfs, ratio, factor, two, remark);
  };
  return kfs_heading(stop->time, temperature, two) +
         line("rate read as Kfs", reads.rate_as_kfs.value) + line("formula", reads.one_head.value) +
         line("formula+", reads.one_head_own_lambda.value, "not available to a crew") +
         line("true", 1.0);
}

}  // namespace ringwright::cases
