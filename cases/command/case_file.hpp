#pragma once
#include <filesystem>
#include <stdexcept>
#include <string>

#include "cases/input/case.hpp"

namespace ringwright::cases {

/// A file that could not be read or written; exit code 5.
class FileError : public std::runtime_error {
 public:
  using std::runtime_error::runtime_error;
};

/// The command line asks for what does not go together; exit code 2.
class UsageError : public std::runtime_error {
 public:
  using std::runtime_error::runtime_error;
};

/// The case in a file.
/// @throws FileError, CaseErrors
Case load_case(const std::filesystem::path& file);

/// `what` with the one test of that name.
/// @throws UsageError if it has none of that name
Case with_one_test(Case what, const std::string& name);

}  // namespace ringwright::cases
