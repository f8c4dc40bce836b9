#include <fmt/format.h>

#include <memory>

#include "cases/command/case_file.hpp"
#include "cases/command/soils_text.hpp"
#include "cases/command/subcommand.hpp"
#include "cases/input/suggestion.hpp"
#include "postprocess/results/json_text.hpp"

namespace ringwright::cases {
namespace {

struct Options {
  std::string texture;
  bool json = false;
};

std::vector<models::PublishedSoil> wanted(const std::string& texture) {
  if (texture.empty()) {
    const auto all = models::published_soils();
    return {all.begin(), all.end()};
  }
  auto rows = models::published_soils_of(normalised(texture));
  if (!rows.empty()) return rows;
  std::vector<std::string> classes;
  for (const auto name : models::texture_classes()) classes.emplace_back(name);
  throw UsageError(
      fmt::format("'{}' is not a texture class; {}", texture, suggest(texture, classes)));
}

}  // namespace

Subcommand add_soils(CLI::App& program, const Console& console) {
  CLI::App* parser =
      program.add_subcommand("soils", "The published soils, with sources and capillary lengths");
  const auto options = std::make_shared<Options>();
  parser->add_option("CLASS", options->texture, "Only this texture class, \"silt loam\"");
  parser->add_flag("--json", options->json, "As JSON, not rounded, in SI");
  return {parser, [options, &console] {
            const auto soils = wanted(options->texture);
            console.out << (options->json ? postprocess::json_text(soils_json(soils))
                                          : soils_text(soils));
            return ExitCode::done;
          }};
}

}  // namespace ringwright::cases
