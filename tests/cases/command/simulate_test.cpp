#include <catch2/catch.hpp>
#include <csignal>
#include <nlohmann/json.hpp>

#include "cases/command/interrupt.hpp"
#include "cases/command/simulate_options.hpp"
#include "tests/cases/command/command_fixture.hpp"

namespace {

using namespace ringwright;
using Catch::Contains;
using Catch::StartsWith;
using nlohmann::json;
using test::Outcome;
using test::run_command;
using test::TemporaryFolder;

const std::vector<std::string> quick_flags = {"--soil",      "sandy loam, moist",
                                              "--published", "Carsel & Parrish 1988",
                                              "--water",     "10 degC",
                                              "--ring",      "12 in",
                                              "--insert",    "4 in",
                                              "--head",      "2 in",
                                              "--stop",      "after 2 h",
                                              "--read",      "every 10 min"};

Outcome simulate_flags(const std::vector<std::string>& more) {
  std::vector<std::string> arguments = {"simulate"};
  arguments.insert(arguments.end(), quick_flags.begin(), quick_flags.end());
  arguments.insert(arguments.end(), more.begin(), more.end());
  return run_command(arguments);
}

json answer_in(const std::string& text) {
  return json::parse(text).at("tests").at(0).at("soils").at(0).at("answer");
}

TEST_CASE("flags and file give the same answer", "[command]") {
  const TemporaryFolder folder;
  const std::string file = folder.file("quick.yaml", test::quick_case());
  const Outcome from_file = run_command({"simulate", file, "--no-files", "--json"});
  const Outcome from_flags = simulate_flags({"--json"});
  REQUIRE(from_file.code == 0);
  REQUIRE(from_flags.code == 0);
  CHECK(from_file.err.empty());
  CHECK(answer_in(from_file.out) == answer_in(from_flags.out));
  // 12 in across.
  CHECK(answer_in(from_file.out)["question"]["ring_radius"]["value"].get<double>() ==
        Approx(0.1524).epsilon(1e-12));
}

TEST_CASE("accuracy beside a file overrides it", "[command]") {
  const TemporaryFolder folder;
  const std::string file = folder.file("quick.yaml", test::quick_case());
  const Outcome outcome =
      run_command({"simulate", file, "--no-files", "--json", "--accuracy", "2 %"});
  REQUIRE(outcome.code == 0);
  CHECK(answer_in(outcome.out)["question"]["accuracy"]["value"] == 0.02);
}

TEST_CASE("the screen goes to standard output, files where they are wanted", "[command]") {
  const TemporaryFolder folder;
  const std::string file = folder.file("quick.yaml", test::quick_case());
  const Outcome outcome = run_command({"simulate", file, "--out", folder / "results"});
  REQUIRE(outcome.code == 0);
  CHECK(outcome.err.empty());
  CHECK_THAT(outcome.out, StartsWith("Ringwright ") && Contains("Stop at 2 h, bring ") &&
                              Contains("you stop here") && Contains("Files  "));
  for (const char* name : {"summary.txt", "ladder.csv", "case.yaml", "record.csv", "answer.json",
                           "fields.h5", "fields.xdmf"}) {
    CAPTURE(name);
    CHECK(std::filesystem::file_size(folder / "results/" + name) > 0);
  }
  CHECK(test::content_of(folder / "results/case.yaml") == test::quick_case());
}

TEST_CASE("where files go if nothing is said", "[command]") {
  cases::SimulateOptions options;
  CHECK_FALSE(cases::folder_of(options));
  options.file = "jobs/My garden.yaml";
  CHECK(*cases::folder_of(options) == "out/my-garden");
  options.out = "here";
  CHECK(*cases::folder_of(options) == "here");
  options.out.clear();
  options.no_files = true;
  CHECK_FALSE(cases::folder_of(options));
}

TEST_CASE("the ladder as CSV is nothing but the table", "[command]") {
  const Outcome outcome = simulate_flags({"--csv"});
  REQUIRE(outcome.code == 0);
  CHECK_THAT(outcome.out, StartsWith("test,soil,source,time_h,"));
  CHECK_THAT(outcome.out, Contains(",never,"));
  CHECK(outcome.err.empty());
}

TEST_CASE("progress is talk", "[command]") {
  const Outcome outcome = simulate_flags({"--progress", "json", "--json"});
  REQUIRE(outcome.code == 0);
  CHECK(json::accept(outcome.out));
  CHECK_THAT(outcome.err, StartsWith("{\"done\":"));
}

// Presses Ctrl-C when the first progress is told.
class PressesCtrlC final : public std::stringbuf {
 protected:
  int sync() override {
    if (!pressed_) std::raise(SIGINT);
    pressed_ = true;
    return 0;
  }

 private:
  bool pressed_ = false;
};

TEST_CASE("Ctrl-C ends the run, leaves valid files and exits 130", "[command]") {
  const TemporaryFolder folder;
  const std::string file = folder.file("quick.yaml", test::quick_case());
  PressesCtrlC talk;
  std::ostream err(&talk);
  std::ostringstream out;
  const int code =
      cases::run({"simulate", file, "--out", folder / "results", "--progress", "json"}, {out, err});
  CHECK(code == 130);
  CHECK_THAT(talk.str(), Contains("interrupted"));
  CHECK_THAT(out.str(), !Contains("NOT MET"));
  const json kept = json::parse(test::content_of(folder / "results/answer.json"));
  CHECK(kept["answer"]["interrupted"] == true);
  for (const auto& entry : std::filesystem::directory_iterator(folder / "results")) {
    CHECK(entry.path().extension() != ".part");
  }
}

TEST_CASE("Ctrl-C is asked for once and then as before", "[command]") {
  struct sigaction before {
  }, after{};
  sigaction(SIGINT, nullptr, &before);
  {
    const cases::Interrupt interrupt;
    CHECK_FALSE(cases::Interrupt::asked());
    std::raise(SIGINT);
    CHECK(cases::Interrupt::asked());
    struct sigaction second {};
    sigaction(SIGINT, nullptr, &second);
    CHECK(second.sa_handler == SIG_DFL);  // a second Ctrl-C ends the program
  }
  sigaction(SIGINT, nullptr, &after);
  CHECK(after.sa_handler == before.sa_handler);
  const cases::Interrupt again;
  CHECK_FALSE(cases::Interrupt::asked());
}

}  // namespace
