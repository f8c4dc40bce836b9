#include <fmt/format.h>

#include <exception>
#include <memory>

#include "cases/command/failure_report.hpp"
#include "cases/command/interrupt.hpp"
#include "cases/command/simulate_options.hpp"
#include "cases/command/subcommand.hpp"
#include "cases/simulate/first_screen.hpp"
#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/result_folder.hpp"
#include "cases/simulate/simulation_json.hpp"
#include "cases/simulate/stages_csv.hpp"
#include "postprocess/results/json_text.hpp"
#include "solver/failure.hpp"

namespace ringwright::cases {
namespace {

using Files = std::vector<std::vector<std::filesystem::path>>;

// Computes as far as it gets. @return what to exit with, a failure being reported already
ExitCode compute(Simulation& simulation, const SimulateOptions& options, const Console& console) {
  const Interrupt interrupt;
  try {
    Progress progress(progress_style(options.progress).value_or(ProgressStyle::none), console.err,
                      console.redraws);
    answer_tests(simulation, threads_of(options), [&](double done) {
      progress.tell(done);
      return !Interrupt::asked();
    });
  } catch (const solver::SolverFailure&) {
    return report_failure(console);
  }
  return simulation.complete() ? ExitCode::done : ExitCode::interrupted;
}

std::string screens(const Simulation& simulation, const Files& files) {
  std::string text;
  for (std::size_t i = 0; i < simulation.tests.size(); ++i) {
    if (i > 0) text += "\n";
    text += first_screen(simulation.what, simulation.tests[i],
                         i < files.size() ? files[i] : std::vector<std::filesystem::path>{});
  }
  return text;
}

void print(const Simulation& simulation, const Files& files, const SimulateOptions& options,
           const Console& console) {
  if (options.json) {
    console.out << postprocess::json_text(simulation_json(simulation));
  } else if (options.csv) {
    console.out << tables_csv(simulation);
  } else {
    console.out << screens(simulation, files);
  }
}

ExitCode simulate(const SimulateOptions& options, const Console& console) {
  Simulation simulation{case_of(options), {}};
  const ExitCode code = compute(simulation, options, console);
  Files files;
  if (!simulation.tests.empty()) {
    if (const auto folder = folder_of(options)) files = write_result_folder(*folder, simulation);
    print(simulation, files, options, console);
  }
  if (code == ExitCode::interrupted) console.error("interrupted; what was computed is kept");
  if (code != ExitCode::done || simulation.accuracy_met()) return code;
  console.warning(fmt::format("the accuracy asked for, {}, is not met; the results say by how much",
                              given_percent(simulation.what.accuracy)));
  return ExitCode::check_failed;
}

}  // namespace

Subcommand add_simulate(CLI::App& program, const Console& console) {
  CLI::App* parser = program.add_subcommand(
      "simulate", "Run the ring test of a case in the computer: the answer, and files");
  parser->footer(
      "\nEither a case file or flags:\n"
      "  ringwright simulate garden.yaml\n"
      "  ringwright simulate --soil \"silt loam, moist\" --ring \"30 cm\" --insert \"10 cm\" "
      "--head \"5 cm\"\n"
      "From a case file the results go to out/<name of the case file>, from flags nowhere, unless "
      "--out says otherwise.");
  const auto options = std::make_shared<SimulateOptions>();
  add_simulate_options(*parser, *options);
  return {parser, [options, &console] { return simulate(*options, console); }};
}

}  // namespace ringwright::cases
