#include "cases/command/failure_report.hpp"

#include <catch2/catch.hpp>
#include <sstream>

#include "cases/command/case_file.hpp"
#include "postprocess/results/atomic_file.hpp"
#include "solver/failure.hpp"

namespace {

using namespace ringwright;
using cases::ExitCode;
using Catch::Contains;

struct Report {
  ExitCode code;
  std::string text;
};

template <typename Failure>
Report report_of(const Failure& failure) {
  std::ostringstream out, err;
  try {
    throw failure;
  } catch (...) {
    const ExitCode code = cases::report_failure({out, err});
    CHECK(out.str().empty());
    return {code, err.str()};
  }
}

TEST_CASE("each failure has its exit code", "[command]") {
  CHECK(report_of(cases::UsageError("x")).code == ExitCode::usage);
  CHECK(report_of(cases::FileError("x")).code == ExitCode::file);
  CHECK(report_of(postprocess::ResultFileError("out/record.csv", "disk full")).code ==
        ExitCode::file);
  CHECK(report_of(std::invalid_argument("zero duration")).code == ExitCode::case_invalid);
  CHECK(report_of(std::logic_error("x")).code == ExitCode::bug);
  CHECK(report_of(42).code == ExitCode::bug);
}

TEST_CASE("a numerical failure names time, step, cause and the worst cells", "[command]") {
  const solver::SolverFailure failure("no convergence", 1800.0, 0.25,
                                      {{17, {0.15, -0.1}, -0.5, 40.0}});
  const Report report = report_of(failure);
  CHECK(report.code == ExitCode::numerical_failure);
  CHECK_THAT(report.text, Contains("failed at 30 min, step 0.25 s: no convergence"));
  CHECK_THAT(report.text, Contains("cell 17 at r 0.15 m, depth 0.1 m: head -0.5 m, 40 times"));
}

TEST_CASE("a file failure names the file and the cause", "[command]") {
  const Report report = report_of(postprocess::ResultFileError("out/record.csv", "disk full"));
  CHECK(report.text == "ringwright: error: cannot write 'out/record.csv': disk full\n");
}

TEST_CASE("colour only where it is wanted", "[command]") {
  std::ostringstream out, err;
  cases::Console{out, err, true, true}.error("x");
  CHECK(err.str() == "ringwright: \033[1;31merror\033[0m: x\n");
}

}  // namespace
