#include "postprocess/results/provenance.hpp"

#include <fmt/format.h>
#include <openssl/crypto.h>

#include <Eigen/Core>

#include "postprocess/results/h5_call.hpp"
#include "postprocess/results/sha256.hpp"

namespace ringwright::postprocess {
namespace {

std::string hdf5_version() {
  unsigned major = 0, minor = 0, release = 0;
  h5_call("ask for the version", [&] { return H5get_libversion(&major, &minor, &release); });
  return fmt::format("{}.{}.{}", major, minor, release);
}

std::vector<NamedVersion> own_libraries() {
  return {{"HDF5", hdf5_version()},
          {"Eigen",
           fmt::format("{}.{}.{}", EIGEN_WORLD_VERSION, EIGEN_MAJOR_VERSION, EIGEN_MINOR_VERSION)},
          {"nlohmann-json", fmt::format("{}.{}.{}", NLOHMANN_JSON_VERSION_MAJOR,
                                        NLOHMANN_JSON_VERSION_MINOR, NLOHMANN_JSON_VERSION_PATCH)},
          {"fmt", fmt::format("{}.{}.{}", FMT_VERSION / 10000, FMT_VERSION / 100 % 100,
                              FMT_VERSION % 100)},
          {"OpenSSL", OpenSSL_version(OPENSSL_VERSION_STRING)}};
}

std::string compiler_version() {
#if defined(__clang__)
  return "Clang " __clang_version__;
#elif defined(__GNUC__)
  return "GCC " __VERSION__;
#else
  return "unknown";
#endif
}

nlohmann::json metres(double value) { return {{"value", value}, {"unit", "m"}}; }
nlohmann::json fraction(double value) { return {{"value", value}, {"unit", "1"}}; }

nlohmann::json libraries_json(const std::vector<NamedVersion>& libraries) {
  nlohmann::json found = nlohmann::json::object();
  for (const auto& [name, version] : libraries) found[name] = version;
  return found;
}

nlohmann::json mesh_json(const MeshSizes& mesh) {
  return {{"cells", mesh.cells},
          {"points", mesh.points},
          {"domain_radius", metres(mesh.domain_radius)},
          {"domain_depth", metres(mesh.domain_depth)}};
}

nlohmann::json tolerances_json(const Provenance& provenance) {
  nlohmann::json found = {{"accuracy", fraction(provenance.accuracy)}};
  if (const auto& resolution = provenance.resolution) {
    found["tip_cell"] = metres(resolution->tip_cell);
    found["top_cell"] = metres(resolution->top_cell);
    found["growth"] = fraction(resolution->growth);
    found["growth_down"] = fraction(resolution->growth_down);
    found["growth_inside"] = fraction(resolution->growth_inside);
    found["splits"] = resolution->splits;
    found["theta_tolerance"] = fraction(resolution->theta_tolerance);
  }
  return found;
}

nlohmann::json statistics_json(const Provenance& provenance) {
  const auto& run = provenance.statistics;
  return {{"steps", run.steps},
          {"newton_iterations", run.newton_iterations},
          {"factorisations", run.factorisations},
          {"convergence_failures", run.convergence_failures},
          {"domain_enlargements", run.domain_enlargements},
          {"balance_error", fraction(run.balance_error)},
          {"total_steps", provenance.total_steps}};
}

}  // namespace

Provenance provenance_of(const Origin& origin, const Answer& answer) {
  Provenance made;
  made.program_version = origin.program_version;
  made.case_text = origin.case_text;
  made.case_sha256 = sha256(origin.case_text);
  made.resolved_case = origin.resolved_case;
  made.libraries = origin.libraries;
  for (auto& library : own_libraries()) made.libraries.push_back(std::move(library));
  made.compiler = compiler_version();
  made.statistics = answer.run.statistics;
  made.mesh = {made.statistics.cells, static_cast<int>(answer.run.drawing.points.size()),
               made.statistics.domain_radius, made.statistics.domain_depth};
  made.accuracy = answer.question.accuracy;
  made.resolution = answer.resolution;
  made.total_steps = answer.total_steps;
  made.written_at = origin.written_at;
  return made;
}

nlohmann::json to_json(const Provenance& provenance) {
  nlohmann::json found = {{"program_version", provenance.program_version},
                          {"case_text", provenance.case_text},
                          {"case_sha256", provenance.case_sha256},
                          {"resolved_case", provenance.resolved_case},
                          {"libraries", libraries_json(provenance.libraries)},
                          {"compiler", provenance.compiler},
                          {"mesh", mesh_json(provenance.mesh)},
                          {"tolerances", tolerances_json(provenance)},
                          {"statistics", statistics_json(provenance)}};
  if (provenance.written_at) found["written_at"] = *provenance.written_at;
  return found;
}

}  // namespace ringwright::postprocess
