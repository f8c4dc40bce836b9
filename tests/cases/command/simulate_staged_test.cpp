#include <algorithm>
#include <catch2/catch.hpp>
#include <filesystem>
#include <nlohmann/json.hpp>

#include "tests/cases/command/command_fixture.hpp"

namespace {

using namespace ringwright;
using Catch::Contains;
using nlohmann::json;
using test::Outcome;
using test::run_command;
using test::TemporaryFolder;

std::string case_of(const std::string& tests) {
  return "ringwright: 1\n"
         "ground:\n"
         "  texture: sandy loam, moist\n"
         "  published: Carsel & Parrish 1988\n"
         "  water: 10 degC\n"
         "tests:\n" +
         tests + "  read: every 10 min\n";
}

const std::string two_heads =
    "  two heads: { ring: 20 cm, insert: 5 cm, heads: \"5 cm then 20 cm, each for 1 h\" }\n";
const std::string double_ring =
    "  double: { inner ring: 30 cm, outer ring: 60 cm, insert: 10 cm, head: 10 cm, stop: after 2 h,"
    " evaporation: 6 mm/d }\n";

// What every cubic metre of the supply became.
void check_water(const json& water) {
  const auto of = [&](const char* key) { return water.at(key).at("value").get<double>(); };
  CHECK(of("supply") > 0.0);
  CHECK(of("supply") ==
        Approx(of("soil") + of("standing") + of("evaporated") + of("removed")).epsilon(1e-6));
}

TEST_CASE("a two-head test has stages and a pair on the screen and in its files", "[command]") {
  const TemporaryFolder folder;
  const std::string file = folder.file("two.yaml", case_of(two_heads));
  const Outcome outcome = run_command({"simulate", file, "--out", folder / "results"});
  REQUIRE(outcome.code == 0);
  CHECK_THAT(outcome.out, Contains("heads 5, 20 cm") && Contains("by the two-head") &&
                              Contains("    1 and 2: 5, 20 cm") && Contains("stages.csv"));
  const json answer = json::parse(test::content_of(folder / "results/answer.json")).at("answer");
  REQUIRE(answer.at("pairs").size() == 1);
  REQUIRE(answer.at("stages").size() == 2);
  CHECK(answer.at("ladder").empty());
  check_water(answer.at("water"));
  // Two lines below the header.
  const std::string table = test::content_of(folder / "results/stages.csv");
  CHECK(std::count(table.begin(), table.end(), '\n') == 3);
  CHECK(run_command({"simulate", file, "--no-files", "--csv"}).out == table);
}

TEST_CASE("a folder used again keeps no stages of another test", "[command]") {
  const TemporaryFolder folder;
  const std::string results = folder / "results";
  REQUIRE(run_command({"simulate", folder.file("two.yaml", case_of(two_heads)), "--out", results})
              .code == 0);
  CHECK(std::filesystem::exists(folder / "results/stages.csv"));
  REQUIRE(run_command({"simulate", folder.file("one.yaml", test::quick_case()), "--out", results})
              .code == 0);
  CHECK_FALSE(std::filesystem::exists(folder / "results/stages.csv"));
}

TEST_CASE("a double ring tells the water of both rings, on the screen and in its files",
          "[command]") {
  const TemporaryFolder folder;
  const std::string file = folder.file("double.yaml", case_of(double_ring));
  const Outcome outcome = run_command({"simulate", file, "--out", folder / "results"});
  REQUIRE(outcome.code == 0);
  CHECK_THAT(outcome.out, Contains("L (inner ring ") && Contains("    outer ring ") &&
                              Contains("    both ") && Contains("Outer ring at the stop: "));
  const json answer = json::parse(test::content_of(folder / "results/answer.json")).at("answer");
  check_water(answer.at("water"));
  check_water(answer.at("outer_water"));
  // 6 mm in a day from the ring of 30 cm, and from what lies between it and 60 cm, in 2 h.
  const double sheet = 0.006 / 12.0, pi = 3.14159265358979;
  CHECK(answer.at("water").at("evaporated").at("value").get<double>() ==
        Approx(sheet * pi * 0.15 * 0.15));
  CHECK(answer.at("outer_water").at("evaporated").at("value").get<double>() ==
        Approx(sheet * pi * (0.30 * 0.30 - 0.15 * 0.15)));
}

}  // namespace
