#pragma once
/// Answers with round, invented numbers, for tests of what is printed.

#include <memory>

#include "cases/simulate/simulation.hpp"

namespace ringwright::test {

/// A soil that is half full wherever it is not saturated.
class HalfFull final : public models::Curves {
 public:
  double saturation(double h) const override { return h < 0.0 ? 0.5 : 1.0; }
  double saturation_slope(double) const override { return 0.0; }
  double relative_conductivity(double h) const override { return h < 0.0 ? 0.0 : 1.0; }
  double relative_conductivity_slope(double) const override { return 0.0; }
  double entry_head() const override { return 0.0; }
  double steepest_head() const override { return 0.0; }
  std::string describe() const override { return "half full"; }
};

constexpr double mm_per_h = 1.0 / 3.6e6;  // [m/s]
constexpr double litre = 1e-3;            // [m3]

/// @param Kfs at 20 degC [mm/h]
inline models::Soil half_full_soil(double Kfs) {
  return {std::make_shared<HalfFull>(), 0.05, 0.45, Kfs * mm_per_h, 0.0};
}

inline postprocess::LadderRow ladder_row(double hours, double rate, double supply, double as_rate,
                                         double formula, double own, double above) {
  postprocess::LadderRow row;
  row.time = hours * 3600.0;
  row.rate.value = rate * mm_per_h;
  row.supply_volume.value = supply * litre;
  row.soil_volume.value = (supply - 3.5) * litre;
  row.reads = {{as_rate, 0.0}, {formula, 0.0}, {own, 0.0}};
  row.above_steady.value = above;
  return row;
}

/// Water at 10 degC taken as 1.3 times as viscous as at 20 degC, exactly.
inline postprocess::Answer answer_frame(double Kfs_at_10_degC) {
  postprocess::Answer answer;
  answer.question.setup.soil = half_full_soil(Kfs_at_10_degC);
  answer.question.setup.initial_head = -3.0;
  answer.question.setup.ring = {0.15, 0.10};
  answer.question.setup.pond_head = 0.05;
  answer.question.viscosity_ratio = 1.3;
  answer.question.stop_readings = 3;
  answer.question.stop_within = 0.05;
  answer.question.assumed_alpha_star = 12.0;
  answer.record.ring_area = 0.07;
  answer.filling_volume = 3.5 * litre;
  answer.own_capillary_length = 0.112;
  answer.worst_relative_error = 0.004;
  answer.accuracy_met = true;
  answer.balance_error = 2e-8;
  return answer;
}

inline postprocess::Answer first_answer() {
  postprocess::Answer answer = answer_frame(14.0);
  answer.ladder = {ladder_row(0.5, 48.0, 6.1, 3.43, 2.0, 1.5, 0.6),
                   ladder_row(3.0, 34.0, 12.8, 2.43, 1.4, 1.2, 0.144),
                   ladder_row(6.0, 32.0, 19.7, 2.29, 1.31, 1.12, 0.0667)};
  answer.ladder[1].stops_here = true;
  answer.steady_rate.value = 30.0 * mm_per_h;
  answer.steady_reads = {{2.14, 0.0}, {1.23, 0.0}, {1.05, 0.0}};
  answer.time_to_steady = {7.5 * 3600.0, false};
  answer.peak_flow = 0.9 * litre / 60.0;
  answer.wetted_depth = {0.30, 0.004};
  answer.wetted_beyond_wall = {0.072, 0.002};
  return answer;
}

inline postprocess::Answer second_answer() {
  postprocess::Answer answer = answer_frame(7.6);
  answer.ladder = {ladder_row(4.0, 21.0, 8.7, 2.76, 1.62, 1.3, 0.05)};
  answer.ladder[0].stops_here = true;
  answer.worst_relative_error = 0.003;
  return answer;
}

/// One test of a 30 cm ring on the readings of a soil that are wanted (1 or 2).
inline cases::Simulation simulation_of(int readings) {
  cases::Simulation simulation;
  cases::Case& what = simulation.what;
  what.job = "Alderwick, twelve gardens";
  what.text = "ringwright: 1\n";
  what.ground.moisture = {"moist", 3.0, {}, {}};
  what.ground.water_temperature = 10.0;
  what.ground.variants.push_back({"silt loam", "First & Table 1901", half_full_soil(18.2)});
  if (readings > 1) {
    what.ground.variants.push_back({"silt loam", "Second et al. 1902", half_full_soil(9.88)});
  }
  what.assumed = {{"ground.water", "water 10 degC"}, {"tests.one head.read", "ruler 1 mm"}};
  cases::Test test;
  test.name = "one head";
  test.ring = {0.15, 0.10};
  test.protocol.head = 0.05;
  test.protocol.longest = 8.0 * 3600.0;
  test.protocol.stop = models::StopWhenSteady{};
  what.tests.push_back(test);
  simulation.tests.push_back({test, {first_answer()}});
  if (readings > 1) simulation.tests[0].answers.push_back(second_answer());
  return simulation;
}

}  // namespace ringwright::test
