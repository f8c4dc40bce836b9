#pragma once
#include <string_view>

namespace ringwright::cases {

enum class ExitCode {
  done = 0,
  bug = 1,
  usage = 2,
  case_invalid = 3,
  numerical_failure = 4,
  file = 5,
  check_failed = 6,
  interrupted = 130
};

/// For --help.
inline constexpr std::string_view exit_code_text =
    "Exit codes:\n"
    "    0  done\n"
    "    1  a bug of this program\n"
    "    2  wrong usage of the command line\n"
    "    3  the case is not valid; the message says where\n"
    "    4  the numerical solution failed\n"
    "    5  a file could not be read or written\n"
    "    6  a check failed: the accuracy asked for was not met (results are there, and say so)\n"
    "  130  interrupted (Ctrl-C); what was computed by then is kept\n";

}  // namespace ringwright::cases
