#include "cases/simulate/stages_csv.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/simulate/csv_field.hpp"
#include "cases/simulate/ladder_csv.hpp"

namespace ringwright::cases {
namespace {

using postprocess::Answer;
using postprocess::HeadPair;
using postprocess::StageReading;

constexpr double mm_per_h = 3.6e6;

// Empty where a stage has no such figure.
std::string cell(double value, double factor) {
  return value == 0.0 ? "" : fmt::format("{:.12g}", value * factor);
}

// Of the pair that ends with a stage.
std::string pair_cells(const Answer& answer, std::size_t stage) {
  const auto pair = std::find_if(answer.pairs.begin(), answer.pairs.end(),
                                 [&](const HeadPair& one) { return one.second == stage; });
  if (pair == answer.pairs.end()) return ",,,,";
  return fmt::format("{},{:.12g},{:.12g},{:.12g},{}", pair->first + 1, pair->kfs.value * mm_per_h,
                     pair->reads.value, pair->kfs_as_read * mm_per_h,
                     pair->physical ? "yes" : "no");
}

std::string row(const std::string& front, const Answer& answer, std::size_t i) {
  const StageReading& stage = answer.stages[i];
  const double steady = stage.steady_rate.value;
  const bool above = steady > 0.0 && stage.rate.value != 0.0;
  return fmt::format(
      "{},{},{},{:.12g},{:.12g},{:.12g},{:.12g},{},{},{:.12g},{},{}\n", front, i + 1,
      stage.soak ? "yes" : "", stage.from / 3600.0, stage.to / 3600.0, stage.head_from * 100.0,
      stage.head_to * 100.0, cell(stage.rate.value, mm_per_h), cell(stage.rate_as_read, mm_per_h),
      stage.soil_volume.value * 1e3,
      above ? fmt::format("{:.12g}", stage.rate.value / steady - 1.0) : "", pair_cells(answer, i));
}

bool by_stages(const Answer& answer) { return answer.ladder.empty() && !answer.stages.empty(); }

}  // namespace

bool has_stages(const Simulation& simulation) {
  return std::any_of(simulation.tests.begin(), simulation.tests.end(), [](const auto& answered) {
    return std::any_of(answered.answers.begin(), answered.answers.end(), by_stages);
  });
}

std::string stages_csv(const Simulation& simulation) {
  std::string text =
      "test,soil,source,stage,soak,from_h,to_h,head_from_cm,head_to_cm,rate_mm_per_h,"
      "rate_as_read_mm_per_h,soil_L,above_steady,pair_with_stage,pair_kfs_mm_per_h,pair_reads_x,"
      "pair_kfs_as_read_mm_per_h,pair_usable\n";
  for (const AnsweredTest& answered : simulation.tests) {
    for (std::size_t i = 0; i < answered.answers.size(); ++i) {
      const Answer& answer = answered.answers[i];
      if (!by_stages(answer)) continue;
      const SoilVariant& variant = simulation.what.ground.variants[i];
      const std::string front = fmt::format("{},{},{}", csv_field(answered.test.name),
                                            csv_field(variant.label), csv_field(variant.source));
      for (std::size_t k = 0; k < answer.stages.size(); ++k) text += row(front, answer, k);
    }
  }
  return text;
}

std::string tables_csv(const Simulation& simulation) {
  const bool ladders =
      std::any_of(simulation.tests.begin(), simulation.tests.end(), [](const auto& answered) {
        return !answered.answers.empty() && !answered.answers.front().ladder.empty();
      });
  if (!has_stages(simulation)) return ladder_csv(simulation);
  return (ladders ? ladder_csv(simulation) + "\n" : "") + stages_csv(simulation);
}

}  // namespace ringwright::cases
