#include "cases/command/run.hpp"

#include <catch2/catch.hpp>

#include "tests/cases/command/command_fixture.hpp"

namespace {

using namespace ringwright;
using Catch::Contains;
using Catch::StartsWith;
using test::Outcome;
using test::run_command;
using test::TemporaryFolder;

// Exit codes: 0 done, 1 bug, 2 usage, 3 case invalid, 4 numerical failure, 5 file, 6 check
// failed, 130 interrupted.

TEST_CASE("wrong usage exits 2, says why and writes no data", "[command]") {
  const TemporaryFolder folder;
  const std::string good = folder.file("good.yaml", test::quick_case());
  const std::vector<std::vector<std::string>> wrong = {
      {},
      {"simulat"},
      {"--loud"},
      {"check"},
      {"check", good, "more"},
      {"simulate"},
      {"simulate", "--json"},
      {"simulate", good, "--loud"},
      {"simulate", good, "--soil", "loam"},
      {"simulate", good, "--json", "--csv"},
      {"simulate", good, "--no-files", "--out", folder / "x"},
      {"simulate", good, "--test", "two heads"},
      {"simulate", good, "--progress", "loud"},
      {"simulate", good, "--threads", "0"},
      {"simulate", good, "--accuracy", "20 %"},
      {"simulate", good, "--accuracy", "fine"},
      {"soils", "loom"},
  };
  for (const auto& arguments : wrong) {
    const Outcome outcome = run_command(arguments);
    CAPTURE(arguments, outcome.err);
    CHECK(outcome.code == 2);
    CHECK(outcome.out.empty());
    CHECK_FALSE(outcome.err.empty());
  }
}

TEST_CASE("a near miss is answered by what was meant", "[command]") {
  CHECK_THAT(run_command({"simulat"}).err, Contains("did you mean 'simulate'?"));
  CHECK_THAT(run_command({"soils", "sandy loom"}).err, Contains("did you mean 'sandy loam'?"));
}

TEST_CASE("help and version are data", "[command]") {
  const Outcome help = run_command({"--help"});
  CHECK(help.code == 0);
  CHECK(help.err.empty());
  for (const char* line : {"0  done", "1  a bug", "2  wrong usage", "3  the case is not valid",
                           "4  the numerical solution failed", "5  a file could not",
                           "6  a check failed", "130  interrupted"}) {
    CHECK_THAT(help.out, Contains(line));
  }
  CHECK_THAT(run_command({"simulate", "--help"}).out, Contains("out/<name of the case file>"));
  CHECK_THAT(run_command({"--version"}).out, StartsWith("ringwright 0."));
}

TEST_CASE("an invalid case exits 3 with the place", "[command]") {
  const TemporaryFolder folder;
  const std::string file = folder.file("bad.yaml", "ringwright: 1\nground:\n  textur: loam\n");
  for (const char* command : {"check", "simulate"}) {
    const Outcome outcome = run_command({command, file});
    CHECK(outcome.code == 3);
    CHECK(outcome.out.empty());
    CHECK_THAT(outcome.err, Contains("bad.yaml:3:3: error: ") && Contains("'texture'"));
  }
  CHECK_FALSE(std::filesystem::exists("out/bad"));
}

TEST_CASE("invalid flags exit 3 and are named", "[command]") {
  const Outcome outcome = run_command(
      {"simulate", "--soil", "loam", "--ring", "30", "--insert", "10 cm", "--head", "5 cm"});
  CHECK(outcome.code == 3);
  CHECK(outcome.out.empty());
  CHECK_THAT(outcome.err, Contains("--ring \"30\""));
}

TEST_CASE("files that cannot be read or written exit 5", "[command]") {
  const TemporaryFolder folder;
  const std::string good = folder.file("good.yaml", test::quick_case());
  const std::vector<std::vector<std::string>> wrong = {
      {"check", folder / "none.yaml"},
      {"check", folder / "."},
      {"new", folder / "no/such/folder.yaml"},
      {"simulate", good, "--out", good + "/below-a-file", "--progress", "none"},
  };
  for (const auto& arguments : wrong) {
    const Outcome outcome = run_command(arguments);
    CAPTURE(arguments, outcome.err);
    CHECK(outcome.code == 5);
    CHECK(outcome.out.empty());
    CHECK_THAT(outcome.err, StartsWith("ringwright: error: cannot "));
  }
}

TEST_CASE("new writes a file that check accepts, and never overwrites", "[command]") {
  const TemporaryFolder folder;
  const std::string file = folder / "case.yaml";
  const Outcome made = run_command({"new", file});
  CHECK(made.code == 0);
  CHECK(made.out.empty());
  const std::string content = test::content_of(file);
  CHECK_THAT(content, Contains("ringwright: 1"));
  CHECK(run_command({"check", file}).code == 0);

  const std::string own = folder.file("own.yaml", "mine\n");
  CHECK(run_command({"new", own}).code == 5);
  CHECK(test::content_of(own) == "mine\n");
  CHECK(run_command({"new", "-"}).out == content);
}

TEST_CASE("check echoes what was given in other units, and every assumption", "[command]") {
  const TemporaryFolder folder;
  const Outcome outcome = run_command({"check", folder.file("inch.yaml", test::quick_case())});
  CHECK(outcome.code == 0);
  CHECK(outcome.err.empty());
  // 12, 4 and 2 times 2.54 cm.
  CHECK_THAT(outcome.out, Contains("ring 30.48 cm (12 in) wide, 10.16 cm (4 in) into the ground"));
  CHECK_THAT(outcome.out, Contains("head 5.08 cm (2 in)"));
  CHECK_THAT(outcome.out, Contains("suction 300 cm"));
  CHECK_THAT(outcome.out, Contains("ruler 1 mm") && Contains("alpha* 0.12 1/cm"));
  CHECK_THAT(outcome.out, Contains("1 test on 1 reading of the soil, 1 virtual test."));
}

TEST_CASE("soils shows every table of a class, with sources", "[command]") {
  const Outcome outcome = run_command({"soils", "Silt Loam"});
  CHECK(outcome.code == 0);
  CHECK_THAT(outcome.out, Contains("Carsel & Parrish 1988") && Contains("Schaap et al. 2001"));
  CHECK_THAT(outcome.out, Contains("Source: Carsel & Parrish 1988, Water Resources Research 24"));
  CHECK_THAT(outcome.out, !Contains("sandy"));
}

// A stream that takes nothing, as a full disk.
class FullDisk final : public std::streambuf {
 protected:
  int overflow(int) override { return traits_type::eof(); }
};

TEST_CASE("data that could not be written are not called done", "[command]") {
  FullDisk full;
  std::ostream out(&full);
  std::ostringstream err;
  CHECK(cases::run({"soils"}, {out, err}) == 5);
  CHECK_THAT(err.str(), Contains("standard output could not be written"));
}

}  // namespace
