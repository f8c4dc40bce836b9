#include "validation/benchmark/problem_export.hpp"

#include <cmath>
#include <nlohmann/json.hpp>

#include "models/soil/van_genuchten.hpp"
#include "solver/domain.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/mesh/ring_mesh.hpp"
#include "solver/ring_patches.hpp"
#include "validation/benchmark/cpu_time.hpp"
#include "validation/benchmark/measured_simulation.hpp"

namespace ringwright::validation {
namespace {

using nlohmann::json;

constexpr double kTightening = 1e-3;  // of the tolerance in time, for the converged volumes

// As in solver/flow/flow_system.hpp: the share of the first cell in the gravity flow.
double gravity_weight(double rise, double capillary_length) {
  const double p = rise / (2.0 * capillary_length);
  return std::abs(p) < 1e-3 ? 0.5 + p / 6.0 : 0.5 * (1.0 + 1.0 / std::tanh(p) - 1.0 / p);
}

json soil_json(const models::Soil& soil) {
  const auto& curves = dynamic_cast<const models::VanGenuchten&>(*soil.curves);
  return {{"theta_r", soil.theta_r},   {"theta_s", soil.theta_s}, {"Ks", soil.Ks},
          {"alpha", curves.alpha()},   {"n", curves.n()},         {"l", curves.l()},
          {"h_s", curves.entry_head()}};
}

json faces_json(const solver::CellsAndFaces& mesh, double lambda) {
  json j;
  for (const solver::Face& f : mesh.faces) {
    j["a"].push_back(f.a), j["b"].push_back(f.b);
    j["transmissibility"].push_back(f.transmissibility);
    j["rise"].push_back(f.rise);
    j["weight_a"].push_back(gravity_weight(f.rise, lambda));
  }
  return j;
}

const char* kind_name(solver::Boundary kind) {
  switch (kind) {
    case solver::Boundary::head:
      return "head";
    case solver::Boundary::seepage:
      return "seepage";
    case solver::Boundary::free_drainage:
      return "free drainage";
    case solver::Boundary::pond:
    case solver::Boundary::flux:
    case solver::Boundary::closed:
      break;
  }
  return "closed";
}

json boundary_json(const solver::CellsAndFaces& mesh, double pond_head, double lambda) {
  auto conditions = solver::ground_conditions(mesh, {});
  conditions[solver::ring_patches(mesh).ring] =
      solver::Condition::constant(solver::Boundary::head, pond_head);
  json j = json::array();
  for (const solver::BoundaryFace& f : mesh.boundary) {
    const auto& condition = conditions[static_cast<std::size_t>(f.patch)];
    if (condition.kind == solver::Boundary::closed) continue;
    j.push_back({{"cell", f.cell},
                 {"patch", mesh.patches[static_cast<std::size_t>(f.patch)]},
                 {"kind", kind_name(condition.kind)},
                 {"transmissibility", f.transmissibility},
                 {"rise", f.rise},
                 {"weight_cell", gravity_weight(f.rise, lambda)},
                 {"area", f.area},
                 {"normal_down", f.normal_down}});
  }
  return j;
}

json volumes(const solver::TestRun& run) {
  json j = json::array();
  for (const solver::Sample& s : run.samples) j.push_back(s.ring_volume);
  return j;
}

}  // namespace

std::string problem_json(const BenchmarkCase& c, double accuracy) {
  const auto table = std::make_shared<solver::CurveTable>(c.setup.soil.curves);
  const double lambda = table->capillary_length();
  solver::Resolution resolution = resolution_of(c, accuracy);
  const solver::TestRun run = measured_cached(c.setup, resolution, table);
  const solver::Domain domain{run.statistics.domain_radius, run.statistics.domain_depth};
  const solver::CellsAndFaces mesh = solver::ring_mesh(c.setup.ring, domain, resolution);
  json reference = json::array();
  for (const ReferenceRow& row : c.rows)
    reference.push_back({{"time", row.time}, {"volume", row.volume}, {"flow", row.flow}});
  json j{{"case", c.name},
         {"accuracy", accuracy},
         {"units", "m, s"},
         {"soil", soil_json(c.setup.soil)},
         {"initial_head", c.setup.initial_head},
         {"pond_head", c.setup.pond_head},
         {"duration", c.setup.duration},
         {"times", c.setup.times},
         {"cell_volume", mesh.volume},
         {"cell_elevation", mesh.elevation},
         {"faces", faces_json(mesh, lambda)},
         {"boundary", boundary_json(mesh, c.setup.pond_head, lambda)},
         {"reference", reference},
         {"own_volume", volumes(run)},
         {"cpu_ms_cached",
          1e3 * cpu_time_of([&] { measured_cached(c.setup, resolution, table); }).median},
         {"cpu_ms_cold", 1e3 * cpu_time_of([&] { measured_cold(c.setup, resolution); }).median}};
  resolution.theta_tolerance *= kTightening;
  j["converged_volume"] = volumes(measured_cached(c.setup, resolution, table));
  return j.dump(1);
}

}  // namespace ringwright::validation
