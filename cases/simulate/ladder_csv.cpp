#include "cases/simulate/ladder_csv.hpp"

#include <fmt/format.h>

#include <string_view>

#include "cases/simulate/csv_field.hpp"
#include "postprocess/reading/true_kfs.hpp"

namespace ringwright::cases {
namespace {

constexpr double mm_per_h = 3.6e6;
constexpr double in_per_h = 3600.0 / 0.0254;
constexpr double litres_per_m3 = 1e3;

std::string figures(double rate, const postprocess::ReadsX& reads, double Kfs, double ratio) {
  std::string text = fmt::format("{:.12g},{:.12g}", rate * mm_per_h, rate * in_per_h);
  for (const auto* figure : {&reads.rate_as_kfs, &reads.one_head, &reads.one_head_own_lambda}) {
    const double reported = figure->value * Kfs * mm_per_h;
    text += fmt::format(",{:.12g},{:.12g},{:.12g}", figure->value, reported, reported * ratio);
  }
  return text;
}

std::string rows_of(const std::string& front, const postprocess::Answer& answer) {
  const double Kfs = postprocess::true_kfs(answer.question);
  const double ratio = answer.question.viscosity_ratio;
  std::string text;
  for (const postprocess::LadderRow& row : answer.ladder) {
    text +=
        fmt::format("{},{:.12g},{:.12g},{:.12g},{},{:.12g},{}\n", front, row.time / 3600.0,
                    row.soil_volume.value * litres_per_m3, row.supply_volume.value * litres_per_m3,
                    figures(row.rate.value, row.reads, Kfs, ratio), row.above_steady.value,
                    row.stops_here ? "yes" : "");
  }
  if (answer.steady_rate.value > 0.0) {
    text += fmt::format("{},never,,,{},0,\n", front,
                        figures(answer.steady_rate.value, answer.steady_reads, Kfs, ratio));
  }
  return text;
}

std::string header() {
  std::string text = "test,soil,source,time_h,soil_L,supply_L,rate_mm_per_h,rate_in_per_h";
  for (const std::string_view name : {"rate_as_kfs", "one_head", "one_head_own_lambda"}) {
    text += fmt::format(",{0}_reads_x,{0}_mm_per_h,{0}_at_20_degC_mm_per_h", name);
  }
  return text + ",above_steady,stops_here\n";
}

}  // namespace

std::string ladder_csv(const Simulation& simulation) {
  std::string text = header();
  for (const AnsweredTest& answered : simulation.tests) {
    for (std::size_t i = 0; i < answered.answers.size(); ++i) {
      const SoilVariant& variant = simulation.what.ground.variants[i];
      text += rows_of(fmt::format("{},{},{}", csv_field(answered.test.name),
                                  csv_field(variant.label), csv_field(variant.source)),
                      answered.answers[i]);
    }
  }
  return text;
}

}  // namespace ringwright::cases
