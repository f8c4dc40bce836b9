#pragma once
/// What every subcommand gives to run(): its parser, and what to do once parsed.

#include <CLI/CLI.hpp>
#include <functional>

#include "cases/command/console.hpp"
#include "cases/command/exit_code.hpp"

namespace ringwright::cases {

struct Subcommand {
  CLI::App* parser = nullptr;     ///< owned by the program's parser
  std::function<ExitCode()> run;  ///< call if the parser was met on the command line
};

Subcommand add_new(CLI::App& program, const Console& console);
Subcommand add_check(CLI::App& program, const Console& console);
Subcommand add_simulate(CLI::App& program, const Console& console);
Subcommand add_soils(CLI::App& program, const Console& console);
Subcommand add_info(CLI::App& program, const Console& console);

}  // namespace ringwright::cases
