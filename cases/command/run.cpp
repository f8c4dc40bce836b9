#include "cases/command/run.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/command/case_file.hpp"
#include "cases/command/failure_report.hpp"
#include "cases/command/subcommand.hpp"
#include "cases/input/suggestion.hpp"
#include "cases/simulate/version.hpp"

namespace ringwright::cases {
namespace {

void refuse_unknown_command(const std::string& word, const std::vector<Subcommand>& commands) {
  std::vector<std::string> names;
  for (const Subcommand& command : commands) names.push_back(command.parser->get_name());
  if (word.starts_with('-') || std::find(names.begin(), names.end(), word) != names.end()) return;
  throw UsageError(fmt::format("no command '{}'; {}", word, suggest(word, names)));
}

ExitCode parse_and_run(std::vector<std::string> arguments, const Console& console) {
  CLI::App program{
      "Ringwright runs a ring infiltration test in the computer before anyone drives "
      "out: how long, how many litres, what rate the form will say, and how far the "
      "Kfs read from it is from the true one. A prediction, not a measurement.",
      "ringwright"};
  program.require_subcommand(1);
  program.set_version_flag("--version", fmt::format("ringwright {}", program_version));
  program.footer("\n" + std::string(exit_code_text) +
                 "Data go to standard output, everything else to standard error.");
  const std::vector<Subcommand> commands = {
      add_new(program, console), add_check(program, console), add_simulate(program, console),
      add_soils(program, console), add_info(program, console)};
  if (arguments.empty()) {
    console.err << program.help();
    return ExitCode::usage;
  }
  refuse_unknown_command(arguments.front(), commands);
  std::reverse(arguments.begin(), arguments.end());
  try {
    program.parse(arguments);
  } catch (const CLI::ParseError& error) {
    // Help and version come this way too, as success.
    if (error.get_exit_code() != 0) throw UsageError(error.what());
    program.exit(error, console.out, console.err);
    return ExitCode::done;
  }
  for (const Subcommand& command : commands) {
    if (command.parser->parsed()) return command.run();
  }
  return ExitCode::usage;
}

}  // namespace

int run(const std::vector<std::string>& arguments, const Console& console) {
  ExitCode code = ExitCode::bug;
  try {
    code = parse_and_run(arguments, console);
    if (!console.out.flush()) throw FileError("standard output could not be written");
  } catch (...) {
    code = report_failure(console);
  }
  console.err.flush();
  return static_cast<int>(code);
}

int run(int argc, char** argv) {
  return run(std::vector<std::string>(argv + std::min(argc, 1), argv + argc), standard_console());
}

}  // namespace ringwright::cases
