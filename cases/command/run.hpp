#pragma once
#include <string>
#include <vector>

#include "cases/command/console.hpp"

namespace ringwright::cases {

/// The program: one command line, run. Data goes to standard output, talk to standard error.
/// @return the exit code (exit_code.hpp)
int run(int argc, char** argv);

/// The same with streams of one's own. @param arguments without the program's name
/// @checked tests/cases/command/run_test.cpp
int run(const std::vector<std::string>& arguments, const Console& console);

}  // namespace ringwright::cases
