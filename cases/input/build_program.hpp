#pragma once
/// Stages as written, made into the program of each ring: durations, ramps, ways down.

#include "cases/input/case_test.hpp"
#include "cases/input/read_heads.hpp"
#include "cases/input/read_stop.hpp"
#include "cases/input/test_section.hpp"

namespace ringwright::cases {

/// How long the test may take, as far as it is said.
struct TimeAllowed {
  double longest = 0.0;            ///< [s]; the default if nothing is said
  std::optional<Place> own_place;  ///< where the test itself names it
  bool is_given = false;
};

/// Fills programs and `protocol` (head, longest) of a test whose rings, lid and supply are known.
/// Reports what cannot be carried out.
/// @return the stages as they run, soak first, in the order of Test::program; empty if reported
std::vector<StageWords> build_program(const TestSection& section, const HeadWords& heads,
                                      const TimeAllowed& allowed, Test& test, Reading& reading);

}  // namespace ringwright::cases
