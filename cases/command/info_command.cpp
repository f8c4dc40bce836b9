#include <fmt/format.h>

#include <CLI/Version.hpp>
#include <memory>

#include "cases/command/subcommand.hpp"
#include "cases/simulate/result_folder.hpp"
#include "cases/simulate/version.hpp"
#include "postprocess/results/json_text.hpp"

namespace ringwright::cases {
namespace {

constexpr std::string_view licence = "Apache-2.0";

std::string_view build_kind() {
#ifdef NDEBUG
  return "optimised, assertions off";
#else
  return "assertions on";
#endif
}

// A provenance of nothing: what a result would say of this program.
postprocess::Provenance own_provenance() {
  postprocess::Origin origin;
  origin.program_version = program_version;
  origin.libraries = own_libraries();
  origin.libraries.push_back({"CLI11", CLI11_VERSION});
  return postprocess::provenance_of(origin, {});
}

std::string info_text(const postprocess::Provenance& own) {
  std::string libraries;
  for (const auto& [name, version] : own.libraries) {
    libraries += fmt::format("{}{} {}", libraries.empty() ? "" : ", ", name, version);
  }
  return fmt::format(
      "Ringwright {}\n"
      "  build      {}, {}\n"
      "  libraries  {}\n"
      "  licence    {}\n"
      "A prediction, not a measurement. The local code and the licensed professional decide.\n",
      program_version, own.compiler, build_kind(), libraries, licence);
}

nlohmann::json info_json(const postprocess::Provenance& own) {
  nlohmann::json libraries = nlohmann::json::object();
  for (const auto& [name, version] : own.libraries) libraries[name] = version;
  return {{"version", program_version},
          {"compiler", own.compiler},
          {"build", build_kind()},
          {"libraries", libraries},
          {"licence", licence}};
}

}  // namespace

Subcommand add_info(CLI::App& program, const Console& console) {
  CLI::App* parser = program.add_subcommand("info", "Version, libraries, build and licence");
  const auto json = std::make_shared<bool>(false);
  parser->add_flag("--json", *json, "As JSON");
  return {parser, [json, &console] {
            const postprocess::Provenance own = own_provenance();
            console.out << (*json ? postprocess::json_text(info_json(own)) : info_text(own));
            return ExitCode::done;
          }};
}

}  // namespace ringwright::cases
