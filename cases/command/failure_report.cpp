#include "cases/command/failure_report.hpp"

#include <fmt/format.h>

#include <exception>
#include <new>

#include "cases/command/case_file.hpp"
#include "cases/input/diagnostic.hpp"
#include "cases/input/number.hpp"
#include "cases/simulate/printed_number.hpp"
#include "postprocess/results/atomic_file.hpp"
#include "solver/failure.hpp"

namespace ringwright::cases {
namespace {

std::string solver_message(const solver::SolverFailure& failure) {
  std::string text = fmt::format("the numerical solution failed at {}, step {:.2g} s: {}",
                                 time_text(failure.time), failure.step, failure.what());
  for (const solver::WorstCell& cell : failure.worst) {
    text += fmt::format(
        "\n  cell {} at r {:.3g} m, depth {:.3g} m: head {:.4g} m, {:.2g} times "
        "the tolerance",
        cell.cell, cell.centre[0], -cell.centre[1], cell.head, cell.size);
  }
  return text;
}

}  // namespace

ExitCode report_failure(const Console& console) {
  try {
    throw;
  } catch (const CaseErrors& errors) {
    console.err << errors.what();
    return ExitCode::case_invalid;
  } catch (const UsageError& error) {
    console.error(error.what());
    console.err << "See  ringwright --help\n";
    return ExitCode::usage;
  } catch (const ValueError& error) {
    console.error(error.what());
    if (!error.hint().empty()) console.err << "  hint: " << error.hint() << '\n';
    return ExitCode::usage;
  } catch (const FileError& error) {
    console.error(error.what());
    return ExitCode::file;
  } catch (const postprocess::ResultFileError& error) {
    console.error(fmt::format("cannot write '{}': {}", error.path().string(), error.cause()));
    return ExitCode::file;
  } catch (const solver::SolverFailure& failure) {
    console.error(solver_message(failure));
    return ExitCode::numerical_failure;
  } catch (const std::invalid_argument& error) {
    console.error(fmt::format("the case cannot be computed: {}", error.what()));
    return ExitCode::case_invalid;
  } catch (const std::exception& error) {
    console.error(fmt::format("a bug of this program, please report it: {}", error.what()));
    return ExitCode::bug;
  } catch (...) {
    console.error("a bug of this program, please report it: an unknown exception");
    return ExitCode::bug;
  }
}

}  // namespace ringwright::cases
