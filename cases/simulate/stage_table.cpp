#include "cases/simulate/stage_table.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "cases/simulate/printed_number.hpp"
#include "postprocess/reading/true_kfs.hpp"

namespace ringwright::cases {
namespace {

using postprocess::Answer;
using postprocess::HeadPair;
using postprocess::StageReading;

constexpr std::size_t most_levels = 8;

bool falls(const StageReading& stage) { return stage.steady_rate.value == 0.0 && !stage.soak; }

// In cm, as a ruler has it.
std::string to_mm(double head) { return centimetres(std::round(head * 1e3) / 1e3); }

// What a row cannot show.
std::string remark(const Answer& answer, const StageReading& stage) {
  if (stage.soak) return "  soak";
  const auto& events = answer.run.events;
  const auto count = std::count_if(events.begin(), events.end(), [&](const solver::Event& event) {
    return event.kind == solver::EventKind::refilled && !event.outer && event.time > stage.from &&
           event.time <= stage.to;
  });
  return count > 0 ? fmt::format("  filled up {} x", count) : "";
}

std::string head_words(const StageReading& stage) {
  const double from = std::max(0.0, stage.head_from), to = std::max(0.0, stage.head_to);
  return falls(stage) ? fmt::format("{} to {}", to_mm(from), to_mm(to)) : to_mm(to);
}

std::string above_words(const StageReading& stage) {
  if (!(stage.steady_rate.value > 0.0) || stage.rate.value == 0.0) return "-";
  return percent(stage.rate.value / stage.steady_rate.value - 1.0);
}

std::string stage_row(const Answer& answer, std::size_t number) {
  const StageReading& stage = answer.stages[number - 1];
  const bool read = !stage.soak && stage.rate.value != 0.0;
  return fmt::format("  {:>5} {:>10} {:>10} {:>12} {:>8} {:>7} {:>9} {:>8} {:>9}{}\n", number,
                     stage.from > 0.0 ? time_text(stage.from) : "start", time_text(stage.to),
                     head_words(stage), read ? mm_per_hour(stage.rate.value) : "-",
                     read ? inch_per_hour(stage.rate.value) : "-", litres(stage.soil_volume.value),
                     above_words(stage), read ? mm_per_hour(stage.rate_as_read) : "-",
                     remark(answer, stage));
}

std::string pair_name(const Answer& answer, const HeadPair& pair) {
  return fmt::format("{} and {}: {}, {} cm", pair.first + 1, pair.second + 1,
                     to_mm(answer.stages[pair.first].head_to),
                     to_mm(answer.stages[pair.second].head_to));
}

std::string kfs_row(const std::string& name, double Kfs, double ratio, bool two) {
  std::string row =
      fmt::format("    {:22} {:>8} {:>8}", name, mm_per_hour(Kfs), inch_per_hour(Kfs));
  if (two) {
    row += fmt::format("   {:>8} {:>8}", mm_per_hour(Kfs * ratio), inch_per_hour(Kfs * ratio));
  }
  return row;
}

std::string pair_row(const Answer& answer, const HeadPair& pair, bool two) {
  const std::string as_read = pair.physical_as_read ? mm_per_hour(pair.kfs_as_read) : "not usable";
  return kfs_row(pair_name(answer, pair), pair.kfs.value, answer.question.viscosity_ratio, two) +
         fmt::format("   {:>7}   {:>10}{}\n", rounded(pair.reads.value), as_read,
                     pair.physical  ? ""
                     : pair.arrived ? "  not usable"
                                    : "  not usable: the level had not come to the head set");
}

std::string pair_heading(double temperature, bool two) {
  std::string above = fmt::format("  {:24} {:>17}", "Pairs of heads, Kfs",
                                  fmt::format("at {:g} degC", temperature));
  std::string below = fmt::format("    {:22} {:>8} {:>8}", "  stages", "mm/h", "in/h");
  if (two) {
    above += fmt::format("   {:>17}", "at 20 degC");
    below += fmt::format("   {:>8} {:>8}", "mm/h", "in/h");
  }
  return above + "   reads x      as read\n" + below +
         fmt::format("   {:>7}   {:>10}\n", "", "mm/h");
}

}  // namespace

std::string stage_table(const Answer& answer) {
  if (answer.stages.empty()) return "";
  std::string text =
      fmt::format("  {:>5} {:>10} {:>10} {:>12} {:>16} {:>9} {:>8} {:>9}\n", "stage", "from", "to",
                  "head", "rate at its end", "into soil", "above", "as read") +
      fmt::format("  {:>5} {:>10} {:>10} {:>12} {:>8} {:>7} {:>9} {:>8} {:>9}\n", "", "", "", "cm",
                  "mm/h", "in/h", "L", "steady", "mm/h");
  for (std::size_t i = 0; i < answer.stages.size(); ++i) text += stage_row(answer, i + 1);
  return text;
}

std::string pair_table(const Answer& answer, double temperature) {
  if (answer.pairs.empty()) return "";
  const bool two = temperature != 20.0;
  std::string text = pair_heading(temperature, two);
  for (const HeadPair& pair : answer.pairs) text += pair_row(answer, pair, two);
  return text +
         kfs_row("true", postprocess::true_kfs(answer.question), answer.question.viscosity_ratio,
                 two) +
         fmt::format("   {:>7}\n", "1.00");
}

std::string level_table(const Answer& answer) {
  const auto& readings = answer.record.readings;
  if (readings.empty() || std::none_of(answer.stages.begin(), answer.stages.end(), falls))
    return "";
  std::string text = fmt::format("  {:>12} {:>10} {:>11} {:>8} {:>9}\n", "time", "level, cm",
                                 "rate, mm/h", "in/h", "reads x");
  const std::size_t rows = std::min(most_levels, readings.size());
  for (std::size_t k = 1; k <= rows; ++k) {
    const std::size_t i = k * readings.size() / rows - 1;
    const double rate = answer.record.rate(i);
    text +=
        fmt::format("  {:>12} {:>10} {:>11} {:>8} {:>9}\n", time_text(readings[i].time),
                    rounded(std::max(0.0, readings[i].head) * 100.0), mm_per_hour(rate),
                    inch_per_hour(rate), rounded(rate / postprocess::true_kfs(answer.question)));
  }
  return text + "    reads x: the rate taken as Kfs, over the true Kfs\n";
}

}  // namespace ringwright::cases
