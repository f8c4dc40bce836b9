#pragma once
#include <CLI/CLI.hpp>
#include <filesystem>
#include <optional>
#include <string>

#include "cases/input/case.hpp"
#include "cases/input/case_from_flags.hpp"
#include "cases/simulate/progress.hpp"

namespace ringwright::cases {

/// What the command line of `simulate` says.
struct SimulateOptions {
  std::string file;  ///< empty: the flags are the case
  CaseFlags flags;
  std::string test;  ///< empty: all
  std::string out;   ///< empty: the default
  bool no_files = false;
  bool json = false;
  bool csv = false;
  std::string progress = "auto";
  int threads = 0;  ///< 0: as many as there are processors
};

/// Declares them.
void add_simulate_options(CLI::App& parser, SimulateOptions& options);

/// The case meant, of one test if one was named.
/// @throws UsageError, ValueError, FileError, CaseErrors
Case case_of(const SimulateOptions& options);

/// Where files go; none: no files.
std::optional<std::filesystem::path> folder_of(const SimulateOptions& options);

int threads_of(const SimulateOptions& options);

}  // namespace ringwright::cases
