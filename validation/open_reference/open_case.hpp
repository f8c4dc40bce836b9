#pragma once
#include <memory>
#include <string>

#include "models/soil/van_genuchten.hpp"
#include "solver/virtual_test.hpp"
#include "validation/reference_file.hpp"

namespace ringwright::validation {

constexpr double kCentimetre = 0.01;
constexpr double kHour = 3600.0;
constexpr double kLitre = 1e-3;
constexpr double kCubicCentimetrePerHour = 1e-6 / 3600.0;

/// A single-ring case of the open reference.
struct OpenCase {
  nlohmann::json rows;       ///< time_h, flow_cm3_per_h, volume_L and their uncertainties
  solver::TestSetup setup;   ///< sampled at the times of the rows
  double steady_flow = 0.0;  ///< [m3/s]
};

/// @param h_s minimum capillary height [m]; the reference has 0
inline OpenCase open_case(const std::string& name, double h_s = 0.0) {
  const nlohmann::json all = reference_of("open_reference"), c = all["cases"][name];
  const nlohmann::json s = all["soils"][c["soil"].get<std::string>()];
  const auto length = [&](const char* key) { return c[key].get<double>() * kCentimetre; };
  OpenCase open;
  open.rows = c["rows"];
  open.steady_flow = c["steady_flow_cm3_per_h"].get<double>() * kCubicCentimetrePerHour;
  open.setup.soil = {
      std::make_shared<models::VanGenuchten>(s["alpha_per_cm"].get<double>() / kCentimetre,
                                             s["n"].get<double>(), 0.5, h_s),
      s["theta_r"], s["theta_s"], s["Ks_cm_per_h"].get<double>() * kCentimetre / kHour, 0.0};
  open.setup.initial_head = length("h0_cm");
  open.setup.ring = {length("a_cm"), length("d_cm"), 0.003};
  open.setup.pond_head = length("H_cm");
  for (const auto& row : open.rows) open.setup.times.push_back(row["time_h"].get<double>() * kHour);
  open.setup.duration = open.setup.times.back();
  return open;
}

}  // namespace ringwright::validation
