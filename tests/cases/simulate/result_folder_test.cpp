#include "cases/simulate/result_folder.hpp"

#include <catch2/catch.hpp>
#include <fstream>
#include <iterator>

#include "cases/simulate/ladder_csv.hpp"
#include "cases/simulate/resolved_case.hpp"
#include "cases/simulate/version.hpp"
#include "postprocess/results/atomic_file.hpp"
#include "tests/cases/simulate/synthetic_answer.hpp"

namespace {

using namespace ringwright;
using Catch::Contains;

std::string content_of(const std::filesystem::path& file) {
  std::ifstream stream(file);
  return {std::istreambuf_iterator<char>(stream), {}};
}

TEST_CASE("names become parts of paths", "[files]") {
  CHECK(cases::path_word("Carsel & Parrish 1988") == "carsel-parrish-1988");
  CHECK(cases::path_word("../etc") == "etc");
  CHECK(cases::path_word("\xC3\xBC") == "unnamed");
}

TEST_CASE("folders only as deep as there is something to tell apart", "[files]") {
  auto what = test::simulation_of(1).what;
  CHECK(cases::answer_folder(what, what.tests[0], what.ground.variants[0]).empty());
  what = test::simulation_of(2).what;
  CHECK(cases::answer_folder(what, what.tests[0], what.ground.variants[1]) == "second-et-al-1902");
  what.tests.push_back(what.tests[0]);
  what.tests[1].name = "One-head";
  // Equal as paths, yet two tests: the second gets a number.
  CHECK(cases::answer_folder(what, what.tests[1], what.ground.variants[0]) ==
        "one-head-2/first-table-1901");
}

TEST_CASE("the ladder as a table is not rounded", "[files]") {
  const std::string table = cases::ladder_csv(test::simulation_of(1));
  CHECK_THAT(table, Contains("\n\"one head\",\"silt loam\",\"First & Table 1901\",3,9.3,12.8,34,"
                             "1.33858267717,2.43,34.02,44.226,1.4,19.6,25.48,1.2,16.8,21.84,"
                             "0.144,yes\n"));
  CHECK_THAT(table, Contains("\"First & Table 1901\",never,,,30,1.18110236220,") ||
                        Contains("\"First & Table 1901\",never,,,30,1.1811023622,"));
}

TEST_CASE("the resolved case is in SI", "[files]") {
  const auto resolved = cases::resolved_case(test::simulation_of(1).what);
  CHECK(resolved["tests"][0]["ring_radius"]["value"] == 0.15);
  CHECK(resolved["ground"]["soils"][0]["initial_head"]["value"] == -3.0);
  CHECK(resolved["ground"]["water_temperature"]["unit"] == "degC");
  CHECK(resolved["assumed"][1]["text"] == "ruler 1 mm");
}

TEST_CASE("a folder that cannot be made is a file error", "[files]") {
  CHECK_THROWS_AS(cases::write_result_folder("/proc/none/such", test::simulation_of(1)),
                  postprocess::ResultFileError);
}

TEST_CASE("the version is that of the build description", "[files]") {
  const std::string build = content_of(std::string(RINGWRIGHT_SOURCE_DIR) + "/CMakeLists.txt");
  CHECK_THAT(build,
             Contains("project(ringwright VERSION " + std::string(cases::program_version) + " "));
}

TEST_CASE("a folder used again holds the results of the last run only", "[files]") {
  namespace fs = std::filesystem;
  const fs::path folder = fs::temp_directory_path() / "ringwright_used_again";
  fs::remove_all(folder);
  cases::write_result_folder(folder, test::simulation_of(2));
  std::ofstream(folder / "first-table-1901" / "notes.txt") << "mine";
  REQUIRE(fs::exists(folder / "second-et-al-1902" / "fields.h5"));
  cases::write_result_folder(folder, test::simulation_of(1));
  CHECK(fs::exists(folder / "fields.h5"));
  CHECK_FALSE(fs::exists(folder / "second-et-al-1902"));
  CHECK_FALSE(fs::exists(folder / "first-table-1901" / "fields.h5"));
  CHECK(content_of(folder / "first-table-1901" / "notes.txt") == "mine");
  fs::remove_all(folder);
}

}  // namespace
