/// Costs of virtual ring tests; README.md beside this file says what is printed.

#include <fmt/format.h>

#include <CLI/CLI.hpp>
#include <cmath>
#include <exception>
#include <fstream>

#include "solver/flow/curve_table.hpp"
#include "validation/benchmark/cpu_time.hpp"
#include "validation/benchmark/measured_simulation.hpp"
#include "validation/benchmark/problem_export.hpp"
#include "validation/benchmark/staged_cost.hpp"

namespace ringwright::validation {
namespace {

struct Options {
  std::string name = "T1", accuracy = "1%", part = "run", output;
  bool cached = false, once = false, staged = false;
};

double fraction(const std::string& text) {
  const double value = std::stod(text);
  return text.back() == '%' ? value / 100.0 : value;
}

Table table_of(const BenchmarkCase& c) {
  return std::make_shared<solver::CurveTable>(c.setup.soil.curves);
}

void print_runs(const BenchmarkCase& c, double accuracy) {
  const Table table = table_of(c);
  const solver::Resolution resolution = resolution_of(c, accuracy);
  const solver::TestRun run = measured_cached(c.setup, resolution, table);
  const WorstError error = worst_error(c, run);
  const CpuTime cold = cpu_time_of([&] { measured_cold(c.setup, resolution); });
  const CpuTime cached = cpu_time_of([&] { measured_cached(c.setup, resolution, table); });
  const auto& s = run.statistics;
  fmt::print(
      "{:<11}{:>5.1f}%{:>7}{:>7}{:>8}{:>7}{:>9.2f}{:>9.2f}{:>9.2f}{:>9.2f}{:>9.2f}{:>8.2f}\n",
      c.name, 100 * accuracy, s.cells, s.steps, s.newton_iterations, s.factorisations,
      1e3 * cold.median, 1e3 * cold.least, 1e3 * cached.median, 1e3 * cached.least,
      100 * error.volume, 100 * error.flow);
}

void print_rest(const BenchmarkCase& c, double accuracy) {
  const Table table = table_of(c);
  const solver::Resolution resolution = resolution_of(c, accuracy);
  const solver::SteadyFlow steady = measured_steady(c.setup, resolution, table);
  const CpuTime steady_time = cpu_time_of([&] { measured_steady(c.setup, resolution, table); });
  const postprocess::Answer answer = measured_answer(c.setup, accuracy);
  const CpuTime answer_time = cpu_time_of([&] { measured_answer(c.setup, accuracy); });
  const SideBySide pair = side_by_side([&] { measured_cached(c.setup, resolution, table); });
  fmt::print("{:<11}{:>5.1f}%{:>7}{:>10.2f}{:>9.2f}{:>10.1f}{:>9.1f}{:>7}{:>9.2f}{:>11.1f}\n",
             c.name, 100 * accuracy, steady.cells, 1e3 * steady_time.median,
             100 * std::abs(steady.ring_flow / c.steady_flow - 1), 1e3 * answer_time.median,
             1e3 * answer_time.least, answer.refinements, 100 * answer.worst_relative_error,
             100 * (pair.together / pair.alone - 1));
}

void print_table() {
  std::vector<BenchmarkCase> cases;
  for (const std::string& name : benchmark_names()) cases.push_back(benchmark_case(name));
  fmt::print("One run (CPU ms)\n{:<11}{:>6}{:>7}{:>7}{:>8}{:>7}{:>9}{:>9}{:>9}{:>9}{:>9}{:>8}\n",
             "case", "asked", "cells", "steps", "Newton", "facto", "cold", "least", "cached",
             "least", "vol err%", "flow%");
  for (const BenchmarkCase& c : cases)
    for (double accuracy : {0.01, 0.003}) print_runs(c, accuracy);
  fmt::print("\nSteady flow, full answer (CPU ms), two runs side by side\n");
  fmt::print("{:<11}{:>6}{:>7}{:>10}{:>9}{:>10}{:>9}{:>7}{:>9}{:>11}\n", "case", "asked", "cells",
             "steady", "err%", "answer", "least", "refin", "est err%", "pair CPU+%");
  for (const BenchmarkCase& c : cases)
    for (double accuracy : {0.01, 0.003}) print_rest(c, accuracy);
  print_staged_costs();
}

// Exactly one of what is asked, for a profiler.
void run_once(const BenchmarkCase& c, const Options& options) {
  const double accuracy = fraction(options.accuracy);
  const solver::Resolution resolution = resolution_of(c, accuracy);
  const Table table = table_of(c);
  if (options.part == "steady")
    measured_steady(c.setup, resolution, table);
  else if (options.part == "answer")
    measured_answer(c.setup, accuracy);
  else if (options.cached)
    measured_cached(c.setup, resolution, table);
  else
    measured_cold(c.setup, resolution);
}

void export_problem(const Options& options) {
  const std::string json =
      problem_json(benchmark_case(options.name), fraction(options.accuracy)) + "\n";
  if (options.output.empty()) {
    fmt::print("{}", json);
    return;
  }
  std::ofstream file(options.output);
  if (!(file << json)) throw std::runtime_error("cannot write " + options.output);
}

int run(int argc, char** argv) {
  CLI::App app{"Costs of virtual ring tests"};
  Options options;
  bool exporting = false;
  app.add_option("--case", options.name, "T1, T4, sandy-loam or clay");
  app.add_option("--accuracy", options.accuracy, "asked for, as in 1%");
  app.add_flag("--once", options.once, "one run of one case and nothing printed");
  app.add_flag("--cached", options.cached, "with --once: the table of the soil is made before");
  app.add_option("--part", options.part, "with --once: steady or answer instead of the run");
  app.add_flag("--staged", options.staged, "only the table of stages and second rings");
  app.add_flag("--export", exporting, "the semi-discrete problem of one case as JSON");
  app.add_option("--output", options.output, "with --export: file instead of standard output");
  CLI11_PARSE(app, argc, argv);
  if (exporting)
    export_problem(options);
  else if (options.staged)
    print_staged_costs();
  else if (options.once)
    run_once(benchmark_case_without_own_run(options.name), options);
  else
    print_table();
  return 0;
}

}  // namespace
}  // namespace ringwright::validation

int main(int argc, char** argv) {
  try {
    return ringwright::validation::run(argc, argv);
  } catch (const std::exception& e) {
    fmt::print(stderr, "{}\n", e.what());
    return 1;
  }
}
