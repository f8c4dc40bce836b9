#pragma once
/// What a crew must know of a test before it relies on it: see FlagKind (answer.hpp) for what is
/// looked at and the numbers that go with it.

#include <vector>

#include "postprocess/reading/answer.hpp"
#include "postprocess/reading/test_plan.hpp"

namespace ringwright::postprocess {

/// A test once run and read.
struct TestAsRead {
  const Question& question;
  const TestPlan& plan;
  const solver::TestRun& run;
  double stop = 0.0;  ///< [s]
  bool rule_met = true;
  double above_steady = 0.0;  ///< true rate of the last reading over the steady one, minus 1 [-]
};

/// In the order of FlagKind.
std::vector<Flag> raise_flags(const TestAsRead& test);

// The flags by what they are about; each adds what it finds.

/// Supply exceeded, reservoir emptied; of both rings.
void supply_flags(const TestAsRead& test, std::vector<Flag>& flags);
/// Flow below the gauge, evaporation share, sealed temperature, stop rule not met, domain reached.
void reading_flags(const TestAsRead& test, std::vector<Flag>& flags);
/// Surfacing, piping, fracture, insertion share.
void ground_flags(const TestAsRead& test, std::vector<Flag>& flags);
/// Lid lift, lid not for use.
void lid_flags(const TestAsRead& test, std::vector<Flag>& flags);

/// Highest head set until the stop [m]. @param outer of the outer ring
double highest_head(const TestAsRead& test, bool outer);

}  // namespace ringwright::postprocess
