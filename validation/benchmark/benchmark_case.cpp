#include "validation/benchmark/benchmark_case.hpp"

#include <algorithm>
#include <cmath>
#include <fstream>
#include <memory>
#include <nlohmann/json.hpp>
#include <stdexcept>

#include "models/soil/catalogue.hpp"
#include "models/soil/van_genuchten.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "solver/steady_ring.hpp"

namespace ringwright::validation {
namespace {

constexpr double kCentimetre = 0.01, kHour = 3600.0, kLitre = 1e-3;
constexpr double kOwnReferenceAccuracy = 5e-4;

models::Soil soil_of(const nlohmann::json& s) {
  models::Soil soil;
  soil.curves = std::make_shared<models::VanGenuchten>(s.at("alpha_per_cm").get<double>() * 100.0,
                                                       s.at("n").get<double>(), 0.5, 0.0);
  soil.theta_r = s.at("theta_r");
  soil.theta_s = s.at("theta_s");
  soil.Ks = s.at("Ks_cm_per_h").get<double>() * kCentimetre / kHour;
  return soil;
}

BenchmarkCase published_case(const std::string& name) {
  std::ifstream file(RINGWRIGHT_SOURCE_DIR "/validation/open_reference/reference.json");
  const nlohmann::json all = nlohmann::json::parse(file);
  const nlohmann::json& j = all.at("cases").at(name);
  const std::string soil = j.at("soil");
  BenchmarkCase c;
  c.name = name;
  c.what = soil + ", a reference case";
  c.setup.soil = soil_of(all.at("soils").at(soil));
  c.setup.ring.radius = j.at("a_cm").get<double>() * kCentimetre;
  c.setup.ring.insertion = j.at("d_cm").get<double>() * kCentimetre;
  c.setup.pond_head = j.at("H_cm").get<double>() * kCentimetre;
  c.setup.initial_head = j.at("h0_cm").get<double>() * kCentimetre;
  const double flow_unit = kCentimetre * kCentimetre * kCentimetre / kHour;
  c.steady_flow = j.at("steady_flow_cm3_per_h").get<double>() * flow_unit;
  for (const auto& row : j.at("rows")) {
    c.rows.push_back({row.at("time_h").get<double>() * kHour,
                      row.at("volume_L").get<double>() * kLitre,
                      row.at("flow_cm3_per_h").get<double>() * flow_unit});
    c.setup.times.push_back(c.rows.back().time);
  }
  c.setup.duration = c.setup.times.back();
  return c;
}

BenchmarkCase class_average_case(const std::string& name, const std::string& texture,
                                 double duration) {
  BenchmarkCase c;
  c.name = name;
  c.what = texture + ", class average of Carsel & Parrish 1988";
  for (const models::PublishedSoil& row : models::published_soils_of(texture))
    if (row.source == "Carsel & Parrish 1988") c.setup.soil = models::make_soil(row);
  c.setup.ring.radius = 0.10;
  c.setup.ring.insertion = 0.05;
  c.setup.pond_head = 0.05;
  c.setup.initial_head = -3.0;
  c.setup.duration = duration;
  for (double share : {0.05, 0.1, 0.25, 0.5, 1.0}) c.setup.times.push_back(share * duration);
  c.own_reference = true;
  return c;
}

void run_own_reference(BenchmarkCase& c) {
  const auto table = std::make_shared<solver::CurveTable>(c.setup.soil.curves);
  const solver::Resolution fine = resolution_of(c, kOwnReferenceAccuracy);
  for (const solver::Sample& s : run_test(c.setup, fine, table).samples)
    c.rows.push_back({s.time, s.ring_volume, s.ring_flow});
  c.steady_flow =
      steady_flow({c.setup.soil, c.setup.ring, c.setup.pond_head}, fine, table).ring_flow;
}

}  // namespace

std::vector<std::string> benchmark_names() { return {"T1", "T4", "sandy-loam", "clay"}; }

BenchmarkCase benchmark_case_without_own_run(std::string_view name) {
  if (name == "T1" || name == "T4") return published_case(std::string(name));
  if (name == "sandy-loam") return class_average_case("sandy-loam", "sandy loam", 6 * kHour);
  if (name == "clay") return class_average_case("clay", "clay", 48 * kHour);
  throw std::invalid_argument("no benchmark case " + std::string(name));
}

BenchmarkCase benchmark_case(std::string_view name) {
  BenchmarkCase c = benchmark_case_without_own_run(name);
  if (c.own_reference) run_own_reference(c);
  return c;
}

solver::Resolution resolution_of(const BenchmarkCase& c, double accuracy) {
  const solver::CurveTable table(c.setup.soil.curves);
  return solver::resolution_for(c.setup, accuracy, table.capillary_length(), c.first_time());
}

WorstError worst_error(const BenchmarkCase& c, const solver::TestRun& run) {
  WorstError worst;
  for (std::size_t i = 0; i < c.rows.size(); ++i) {
    const ReferenceRow& row = c.rows[i];
    const solver::Sample& s = run.samples.at(i);
    const double share = row.time / c.setup.duration * (1 + 1e-9);
    if (share >= 0.05)
      worst.volume = std::max(worst.volume, std::abs(s.ring_volume / row.volume - 1));
    if (share >= 0.25) worst.flow = std::max(worst.flow, std::abs(s.ring_flow / row.flow - 1));
  }
  return worst;
}

}  // namespace ringwright::validation
