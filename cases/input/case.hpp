#pragma once
/// The case file once read: SI numbers, defaults filled in, every default listed.

#include <filesystem>
#include <string>
#include <vector>

#include "cases/input/case_ground.hpp"
#include "cases/input/case_test.hpp"

namespace ringwright::cases {

/// A value that the user did not give, or a word about one that was given.
struct Assumption {
  std::string key;   ///< where it could be given, e.g. "ground.water"
  std::string text;  ///< for the screen, e.g. "water 20 degC"
};

struct Case {
  std::string job;             ///< free text
  std::filesystem::path file;  ///< empty when made from flags
  std::string text;            ///< the case text itself, for provenance
  double accuracy = 0.01;      ///< [-]
  Ground ground;
  std::vector<Test> tests;  ///< at least one
  std::vector<Assumption> assumed;
  std::vector<Assumption> warnings;  ///< can be run as it is, but is hardly meant
};

}  // namespace ringwright::cases
