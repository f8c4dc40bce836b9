#include "cases/simulate/result_folder.hpp"

#include <algorithm>
#include <boost/version.hpp>
#include <cctype>
#include <set>
#include <system_error>

#include "cases/simulate/first_screen.hpp"
#include "cases/simulate/ladder_csv.hpp"
#include "cases/simulate/older_results.hpp"
#include "cases/simulate/resolved_case.hpp"
#include "cases/simulate/stages_csv.hpp"
#include "cases/simulate/version.hpp"
#include "postprocess/results/atomic_file.hpp"
#include "postprocess/results/result_files.hpp"
#include "solver/time/sundials_version.hpp"

namespace ringwright::cases {
namespace {

namespace fs = std::filesystem;

std::string boost_version() {
  std::string version = BOOST_LIB_VERSION;
  std::replace(version.begin(), version.end(), '_', '.');
  return version;
}

void make_folder(const fs::path& folder) {
  std::error_code error;
  fs::create_directories(folder, error);
  if (error) throw postprocess::ResultFileError(folder, error.message());
}

// Names that come out equal as paths would overwrite each other; a number keeps them apart.
template <typename Range, typename Name>
std::string unique_word(const Range& range, std::size_t index, Name name) {
  const std::string word = path_word(name(range[index]));
  std::size_t equals = 0;
  for (std::size_t i = 0; i < index; ++i) equals += path_word(name(range[i])) == word;
  return equals == 0 ? word : word + "-" + std::to_string(equals + 1);
}

template <typename Range, typename Item>
std::size_t index_of(const Range& range, const Item& item, std::string Item::*name) {
  const auto found = std::find_if(range.begin(), range.end(), [&](const Item& candidate) {
    return candidate.*name == item.*name;
  });
  return static_cast<std::size_t>(found - range.begin());
}

std::vector<fs::path> write_test(const fs::path& folder, const Simulation& simulation,
                                 const AnsweredTest& answered, const postprocess::Origin& origin) {
  std::vector<fs::path> files;
  for (std::size_t i = 0; i < answered.answers.size(); ++i) {
    const postprocess::Answer& answer = answered.answers[i];
    const fs::path target =
        folder / answer_folder(simulation.what, answered.test, simulation.what.ground.variants[i]);
    make_folder(target);
    const auto written =
        postprocess::write_results(target, answer, postprocess::provenance_of(origin, answer));
    files.insert(files.end(), {written.record, written.answer, written.fields, written.picture});
  }
  return files;
}

}  // namespace

std::string path_word(std::string_view name) {
  std::string word;
  for (const char c : name) {
    const auto byte = static_cast<unsigned char>(c);
    if (byte < 128 && std::isalnum(byte) != 0) {
      word += static_cast<char>(std::tolower(byte));
    } else if (!word.empty() && word.back() != '-') {
      word += '-';
    }
  }
  while (!word.empty() && word.back() == '-') word.pop_back();
  return word.empty() ? "unnamed" : word;
}

fs::path answer_folder(const Case& what, const Test& test, const SoilVariant& variant) {
  fs::path folder;
  if (what.tests.size() > 1) {
    folder /= unique_word(what.tests, index_of(what.tests, test, &Test::name),
                          [](const Test& one) { return one.name; });
  }
  const auto& variants = what.ground.variants;
  if (variants.size() > 1) {
    folder /= unique_word(variants, index_of(variants, variant, &SoilVariant::source),
                          [](const SoilVariant& one) { return one.source; });
  }
  return folder;
}

std::vector<postprocess::NamedVersion> own_libraries() {
  return {{"SUNDIALS", solver::sundials_version()}, {"Boost", boost_version()}};
}

postprocess::Origin origin_of(const Case& what) {
  postprocess::Origin origin;
  origin.program_version = program_version;
  origin.case_text = what.text;
  origin.resolved_case = resolved_case(what);
  origin.libraries = own_libraries();
  return origin;
}

std::vector<std::vector<fs::path>> write_result_folder(const fs::path& folder,
                                                       const Simulation& simulation) {
  make_folder(folder);
  const postprocess::Origin origin = origin_of(simulation.what);
  std::vector<std::vector<fs::path>> files;
  std::string screens;
  for (const AnsweredTest& answered : simulation.tests) {
    files.push_back(write_test(folder, simulation, answered, origin));
    screens += first_screen(simulation.what, answered) + "\n";
  }
  std::vector<std::pair<fs::path, std::string>> common = {
      {folder / "summary.txt", screens},
      {folder / "ladder.csv", ladder_csv(simulation)},
      {folder / "case.yaml", simulation.what.text}};
  if (has_stages(simulation)) common.emplace_back(folder / "stages.csv", stages_csv(simulation));
  for (const auto& [path, content] : common) postprocess::write_atomically(path, content);
  if (!files.empty()) {
    auto& first = files.front();
    for (std::size_t i = common.size(); i-- > 0;) first.insert(first.begin(), common[i].first);
  }
  std::set<fs::path> written;
  for (const auto& paths : files) written.insert(paths.begin(), paths.end());
  remove_older_results(folder, written);
  return files;
}

}  // namespace ringwright::cases
