#include <fmt/format.h>

#include <cerrno>
#include <cstdio>
#include <memory>
#include <system_error>

#include "cases/command/case_file.hpp"
#include "cases/command/subcommand.hpp"
#include "cases/input/starter_case.hpp"

namespace ringwright::cases {
namespace {

// Exclusive creation, so that no file is ever overwritten, not even one made meanwhile.
void write_new_file(const std::string& name, const std::string& text) {
  std::FILE* file = std::fopen(name.c_str(), "wx");
  if (file == nullptr) {
    const std::string reason =
        errno == EEXIST ? "it exists; give another name" : std::generic_category().message(errno);
    throw FileError(fmt::format("cannot write '{}': {}", name, reason));
  }
  const bool written = std::fwrite(text.data(), 1, text.size(), file) == text.size();
  const bool closed = std::fclose(file) == 0;
  if (written && closed) return;
  std::remove(name.c_str());
  throw FileError(fmt::format("cannot write '{}': the disk may be full", name));
}

}  // namespace

Subcommand add_new(CLI::App& program, const Console& console) {
  CLI::App* parser = program.add_subcommand("new", "Write a commented case file to start from");
  const auto file = std::make_shared<std::string>("case.yaml");
  parser->add_option("FILE", *file, "Name of the file; never overwritten. '-': standard output")
      ->capture_default_str();
  return {parser, [file, &console] {
            if (*file == "-") {
              console.out << starter_case();
              return ExitCode::done;
            }
            write_new_file(*file, starter_case());
            console.err << fmt::format(
                "Wrote {}. Change it to what you know, then  ringwright check {}\n", *file, *file);
            return ExitCode::done;
          }};
}

}  // namespace ringwright::cases
