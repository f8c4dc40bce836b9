#include "cases/command/console.hpp"

#include <unistd.h>

#include <cstdlib>
#include <iostream>
#include <string>

namespace ringwright::cases {
namespace {

constexpr std::string_view red = "\033[1;31m", yellow = "\033[1;33m", plain = "\033[0m";

std::string environment(const char* name) {
  const char* value = std::getenv(name);
  return value == nullptr ? "" : value;
}

void say(const Console& console, std::string_view colour, std::string_view kind,
         std::string_view message) {
  console.err << "ringwright: ";
  if (console.colour) console.err << colour;
  console.err << kind;
  if (console.colour) console.err << plain;
  console.err << ": " << message;
  if (message.empty() || message.back() != '\n') console.err << '\n';
}

}  // namespace

void Console::error(std::string_view message) const { say(*this, red, "error", message); }

void Console::warning(std::string_view message) const { say(*this, yellow, "warning", message); }

Console standard_console() {
  const std::string terminal = environment("TERM");
  const bool redraws = isatty(STDERR_FILENO) != 0 && !terminal.empty() && terminal != "dumb";
  return {std::cout, std::cerr, redraws, redraws && environment("NO_COLOR").empty()};
}

}  // namespace ringwright::cases
