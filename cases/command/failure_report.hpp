#pragma once
#include "cases/command/console.hpp"
#include "cases/command/exit_code.hpp"

namespace ringwright::cases {

/// Says on console.err what went wrong and gives the exit code. Call inside a catch block; looks
/// at the exception being handled.
ExitCode report_failure(const Console& console);

}  // namespace ringwright::cases
