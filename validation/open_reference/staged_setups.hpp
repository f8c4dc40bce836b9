#pragma once
/// The two-head ring and the double ring of the open reference as setups.

#include "validation/open_reference/open_case.hpp"

namespace ringwright::validation {

// Of the reference's own Kfs, which is made from two of its flows (uncertainty 0.05 % each, times
// the amplification of the pair) and printed to three decimals: 0.23 % for 2-1 and 2-3.
constexpr double kKfsUncertainty = 0.003;

inline models::Soil reference_soil(const nlohmann::json& all, const std::string& name) {
  const nlohmann::json s = all["soils"][name];
  return {std::make_shared<models::VanGenuchten>(s["alpha_per_cm"].get<double>() / kCentimetre,
                                                 s["n"].get<double>(), 0.5, 0.0),
          s["theta_r"], s["theta_s"], s["Ks_cm_per_h"].get<double>() * kCentimetre / kHour};
}

/// 5 cm for 40 min, 15 cm for 20 min, 5 cm for 20 min, 15 cm for 20 min: stated there in words.
inline solver::TestSetup reference_two_heads(const nlohmann::json& all) {
  const nlohmann::json c = all["cases"]["P11"];
  const auto length = [&](const char* key) { return c[key].get<double>() * kCentimetre; };
  solver::TestSetup s;
  s.soil = reference_soil(all, c["soil"]);
  s.initial_head = length("h0_cm");
  s.ring = {length("a_cm"), length("d_cm")};
  const double heads[] = {0.05, 0.15, 0.05, 0.15}, minutes[] = {40, 20, 20, 20};
  for (int k = 0; k < 4; ++k) {
    s.program.stages.push_back(
        {.head = heads[k], .duration = minutes[k] * 60.0, .down = models::StepDown::bail});
    s.duration += minutes[k] * 60.0;
  }
  return s;
}

/// Without the times of its rows.
inline solver::TestSetup reference_double_ring(const nlohmann::json& all) {
  const nlohmann::json c = all["cases"]["D1a"];
  const auto length = [&](const char* key) { return c[key].get<double>() * kCentimetre; };
  solver::TestSetup s;
  s.soil = reference_soil(all, c["soil"]);
  s.initial_head = length("h0_cm");
  s.ring = {length("inner_a_cm"), length("d_cm")};
  s.outer_ring = models::SingleRing{length("outer_a_cm"), length("d_cm")};
  s.pond_head = length("H_cm");
  for (const auto& row : c["rows"])
    s.duration = std::max(s.duration, row["time_h"].get<double>() * kHour);
  return s;
}

}  // namespace ringwright::validation
