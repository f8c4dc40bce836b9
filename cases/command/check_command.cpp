#include <memory>

#include "cases/command/case_file.hpp"
#include "cases/command/check_text.hpp"
#include "cases/command/subcommand.hpp"
#include "cases/simulate/resolved_case.hpp"
#include "postprocess/results/json_text.hpp"

namespace ringwright::cases {
namespace {

struct Options {
  std::string file;
  bool json = false;
};

}  // namespace

Subcommand add_check(CLI::App& program, const Console& console) {
  CLI::App* parser = program.add_subcommand(
      "check", "Read a case without computing: what would run, what is assumed, how long it takes");
  const auto options = std::make_shared<Options>();
  parser->add_option("CASE", options->file, "Case file")->required();
  parser->add_flag("--json", options->json, "The case in SI, defaults filled in, as JSON");
  return {parser, [options, &console] {
            const Case what = load_case(options->file);
            console.out << (options->json ? postprocess::json_text(resolved_case(what))
                                          : check_text(what));
            return ExitCode::done;
          }};
}

}  // namespace ringwright::cases
