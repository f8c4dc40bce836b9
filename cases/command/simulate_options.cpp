#include "cases/command/simulate_options.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <thread>

#include "cases/command/case_file.hpp"
#include "cases/input/schema.hpp"
#include "cases/input/units.hpp"
#include "cases/simulate/result_folder.hpp"

namespace ringwright::cases {
namespace {

using Value = std::optional<std::string>;

struct FlagOfCase {
  const char* names;
  Value CaseFlags::*value;
  const char* help;
};

constexpr std::array<FlagOfCase, 28> case_flags{{
    {"--job", &CaseFlags::job, "Name of the job"},
    {"--soil", &CaseFlags::soil, "\"silt loam, moist\": class, and dry, moist or wet"},
    {"--published", &CaseFlags::published, "One table of class averages instead of all"},
    {"--capillary-length", &CaseFlags::capillary_length, "\"8 cm\", instead of --soil"},
    {"--alpha-star", &CaseFlags::alpha_star, "\"0.12 1/cm\", instead of --soil"},
    {"--fillable-porosity", &CaseFlags::fillable_porosity, "\"25 %\", with one of the last two"},
    {"--kfs", &CaseFlags::Kfs, "\"18 mm/h at 20 degC\""},
    {"--moisture", &CaseFlags::moisture, "\"suction 300 cm\", \"content 25 %\", \"60 % full\""},
    {"--minimum-capillary-height", &CaseFlags::capillary_height, "\"-2 cm\""},
    {"--water", &CaseFlags::water, "Temperature, \"10 degC\""},
    {"--ring", &CaseFlags::ring, "Inner diameter, \"30 cm\""},
    {"--insert", &CaseFlags::insert, "How deep the wall stands in the ground, \"10 cm\""},
    {"--head", &CaseFlags::head, "Depth of water held in the ring, \"5 cm\""},
    {"--heads", &CaseFlags::heads, "Instead of --head: \"5 cm then 15 cm, each for 1 h\""},
    {"--fall", &CaseFlags::fall, "Instead of --head: \"from 20 cm to 5 cm\""},
    {"--soak", &CaseFlags::soak, "First, not read: \"5 cm for 30 min\""},
    {"--outer-ring", &CaseFlags::outer_ring, "Inner diameter of an outer ring, \"60 cm\""},
    {"--outer-insert", &CaseFlags::outer_insert, "As --insert, of the outer ring, \"15 cm\""},
    {"--outer-head", &CaseFlags::outer_head, "As --head, of the outer ring, \"5 cm\""},
    {"--wall", &CaseFlags::wall, "Thickness of the wall, \"3 mm\""},
    {"--stop", &CaseFlags::stop, "\"after 6 h\" or \"3 readings within 5 %, or 8 h\""},
    {"--read", &CaseFlags::read, "\"every 10 min\""},
    {"--supply", &CaseFlags::supply, "Largest flow, \"6 L/min\""},
    {"--reservoir", &CaseFlags::reservoir, "\"200 L\""},
    {"--gauge", &CaseFlags::gauge, "One division, \"10 mL\" or \"1 mm in a 10 cm tube\""},
    {"--test-level", &CaseFlags::test_level, "Below ground, \"60 cm\""},
    {"--water-table", &CaseFlags::water_table, "Below ground, \"2 m\""},
    {"--assumed-alpha-star", &CaseFlags::assumed_alpha_star, "What the crew puts in its formula"},
}};

std::vector<std::string> given_flags(const CaseFlags& flags) {
  std::vector<std::string> given;
  for (const FlagOfCase& flag : case_flags) {
    if (flags.*flag.value) given.emplace_back(flag.names);
  }
  return given;
}

// The accuracy typed beside a case file, held to the range of the grammar.
double read_accuracy(const std::string& text) {
  const double accuracy = Units().read(text, Dimension::fraction);
  const Key file = case_file_grammar();
  const Key* key = file.find("accuracy");
  if (key != nullptr && key->range &&
      (accuracy < key->range->least || accuracy > key->range->most)) {
    throw ValueError(fmt::format("--accuracy \"{}\" is out of range", text),
                     "allowed: " + key->range->words);
  }
  return accuracy;
}

Case case_from_file(const SimulateOptions& options) {
  const auto given = given_flags(options.flags);
  if (!given.empty()) {
    throw UsageError(
        fmt::format("give a case file or describe the case by flags, not both: {} "
                    "beside '{}'",
                    fmt::join(given, ", "), options.file));
  }
  Case what = load_case(options.file);
  if (options.flags.accuracy) what.accuracy = read_accuracy(*options.flags.accuracy);
  return what;
}

}  // namespace

void add_simulate_options(CLI::App& parser, SimulateOptions& options) {
  parser.add_option("CASE", options.file, "Case file; without one the flags describe the case");
  for (const FlagOfCase& flag : case_flags) {
    parser.add_option(flag.names, options.flags.*flag.value, flag.help)
        ->ignore_case()
        ->group("The case by flags, as in a case file");
  }
  parser.add_option("--accuracy", options.flags.accuracy,
                    "Numerical accuracy of every figure, \"1 %\"; overrides the case file");
  parser.add_option("--test", options.test, "Only the test of this name");
  auto* out = parser.add_option(
      "--out", options.out,
      "Folder for files. Default: out/<name of the case file>; from flags: no files");
  parser.add_flag("--no-files", options.no_files, "Write no files")->excludes(out);
  auto* json = parser.add_flag("--json", options.json, "Everything, not rounded, as JSON");
  parser.add_flag("--csv", options.csv, "The stop ladders as a table")->excludes(json);
  parser.add_option("--progress", options.progress, "How progress is told on standard error")
      ->check(CLI::IsMember({"auto", "bar", "lines", "json", "none"}))
      ->capture_default_str();
  parser
      .add_option("--threads", options.threads,
                  "Runs side by side; never changes a result. Default: all processors")
      ->check(CLI::Range(1, 1024));
}

Case case_of(const SimulateOptions& options) {
  if (options.file.empty() && given_flags(options.flags).empty()) {
    throw UsageError(
        "give a case file, or describe the case: "
        "--soil \"silt loam, moist\" --ring \"30 cm\" --insert \"10 cm\" "
        "--head \"5 cm\"");
  }
  Case what = options.file.empty() ? case_from_flags(options.flags) : case_from_file(options);
  return options.test.empty() ? what : with_one_test(std::move(what), options.test);
}

std::optional<std::filesystem::path> folder_of(const SimulateOptions& options) {
  if (options.no_files) return std::nullopt;
  if (!options.out.empty()) return options.out;
  if (options.file.empty()) return std::nullopt;
  const auto stem = std::filesystem::path(options.file).stem().string();
  return std::filesystem::path("out") / path_word(stem);
}

int threads_of(const SimulateOptions& options) {
  if (options.threads > 0) return options.threads;
  return static_cast<int>(std::max(1U, std::thread::hardware_concurrency()));
}

}  // namespace ringwright::cases
