#include "cases/simulate/ladder_table.hpp"

#include <fmt/format.h>

#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/simulation.hpp"
#include "cases/simulate/stop_figures.hpp"
#include "postprocess/reading/true_kfs.hpp"

namespace ringwright::cases {
namespace {

using postprocess::Answer;
using postprocess::LadderRow;
using postprocess::ReadsX;

std::string row(std::string_view mark, std::string_view time, double rate, std::string_view water,
                const ReadsX& reads, std::string_view above, std::string_view remark) {
  std::string line =
      fmt::format("  {:1} {:>10} {:>7} {:>7} {:>7}   {:>6} {:>8} {:>9} {:>8}", mark, time,
                  mm_per_hour(rate), inch_per_hour(rate), water, rounded(reads.rate_as_kfs.value),
                  rounded(reads.one_head.value), rounded(reads.one_head_own_lambda.value), above);
  if (!remark.empty()) line += fmt::format("  {}", remark);
  return line + "\n";
}

std::string_view stop_remark(const Answer& answer) {
  if (answer.ended_early) return "the water is used up";
  if (!has_rule(answer)) return "you stop here";
  return answer.stop_rule_met ? "your rule stops here" : "rule not met; you stop";
}

// The widths are those of row().
std::string heading() {
  return fmt::format("  {:1} {:>10} {:>15} {:>7}   {:>25} {:>8}\n", "", "stop at", "rate then   ",
                     "water", "reads x (true Kfs = 1)", "above") +
         fmt::format("  {:1} {:>10} {:>7} {:>7} {:>7}   {:>6} {:>8} {:>9} {:>8}\n", "", "", "mm/h",
                     "in/h", "L", "rate", "formula", "formula+", "steady");
}

// The formula knows one ring only.
std::string_view outer_note(const Answer& answer) {
  return answer.question.setup.outer_ring
             ? "    the formula is made for one ring; beside an outer ring it takes off too much\n"
               "    rate and water are those of the inner ring\n"
             : "";
}

// A supply that is limited has not always filled the ring.
std::string water_note(const Answer& answer) {
  return answer.question.setup.program.supply.is_limited()
             ? "water: what the supply gave, into ring and soil"
             : fmt::format("water with the {} L that fill the ring", litres(answer.filling_volume));
}

std::string notes(const Answer& answer) {
  return fmt::format(
             "    formula: one head, Reynolds & Elrick 1990, with the assumed alpha* {:g} 1/cm\n"
             "    formula+: the same with this soil's own capillary length, {}: not available to a "
             "crew\n"
             "    {}; above steady: not yet steady by so "
             "much\n",
             answer.question.assumed_alpha_star / 100.0, about_cm(answer.own_capillary_length),
             water_note(answer)) +
         std::string(outer_note(answer));
}

std::string kfs_row(std::string_view name, double Kfs, double viscosity_ratio, double factor,
                    bool two_temperatures, std::string_view remark = "") {
  std::string line =
      fmt::format("    {:20} {:>8} {:>8}", name, mm_per_hour(Kfs), inch_per_hour(Kfs));
  if (two_temperatures) {
    line += fmt::format("   {:>8} {:>8}", mm_per_hour(Kfs * viscosity_ratio),
                        inch_per_hour(Kfs * viscosity_ratio));
  }
  line += fmt::format("   {:>7}", rounded(factor));
  if (!remark.empty()) line += fmt::format("  {}", remark);
  return line + "\n";
}

// The widths are those of kfs_row().
std::string kfs_heading(double stop_time, double temperature, bool two_temperatures) {
  std::string above = fmt::format("  {:22} {:>17}", "Kfs read at " + time_text(stop_time),
                                  fmt::format("at {:g} degC", temperature));
  std::string below = fmt::format("    {:20} {:>8} {:>8}", "", "mm/h", "in/h");
  if (two_temperatures) {
    above += fmt::format("   {:>17}", "at 20 degC");
    below += fmt::format("   {:>8} {:>8}", "mm/h", "in/h");
  }
  return above + "   reads x\n" + below + "\n";
}

}  // namespace

std::string ladder_table(const Answer& answer) {
  std::string text = heading();
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
  const double Kfs = postprocess::true_kfs(answer.question);
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
