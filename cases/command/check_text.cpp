#include "cases/command/check_text.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "cases/command/check_ground.hpp"
#include "cases/command/check_test.hpp"
#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"

namespace ringwright::cases {
namespace {

std::string plural(std::size_t count, std::string_view one, std::string_view many) {
  return fmt::format("{} {}", count, count == 1 ? one : many);
}

std::string lines(const std::vector<Assumption>& what) {
  std::size_t longest = 0;
  for (const Assumption& line : what) longest = std::max(longest, line.key.size());
  std::string text;
  for (const Assumption& line : what) {
    text += paragraph(line.text, fmt::format("  {:{}}  ", line.key, longest),
                      std::string(longest + 4, ' '));
  }
  return text;
}

std::string assumed_lines(const Case& what) {
  if (what.assumed.empty()) return "Nothing is assumed: everything was given.\n";
  return "Assumed, change if wrong (left: where to give it):\n" + lines(what.assumed);
}

std::string warning_lines(const Case& what) {
  if (what.warnings.empty()) return "";
  return "Hardly meant, look at it:\n" + lines(what.warnings) + "\n";
}

// Work over that of one constant head on one soil, as measured on the examples beside the code.
double work_of(const Test& test, const Ground& ground) {
  const auto falls = [](const models::Stage& stage) {
    return stage.kind == models::StageKind::free_fall;
  };
  const auto& stages = test.program.stages;
  double work = 1.0;
  if (test.outer_ring) work *= 4.0;
  if (std::any_of(stages.begin(), stages.end(), falls)) work *= 20.0;
  if (!ground.layers_below.empty() || ground.disturbed || ground.gap) work *= 10.0;
  return work;
}

}  // namespace

double rough_duration(const Case& what) {
  // Measured on one core of a common machine; a finer answer has more cells and more steps.
  constexpr double seconds_at_one_per_cent = 0.2;
  double runs = 0.0;
  for (const Test& test : what.tests) runs += work_of(test, what.ground);
  runs *= static_cast<double>(what.ground.variants.size());
  return runs * seconds_at_one_per_cent * std::pow(0.01 / what.accuracy, 1.2);
}

std::string check_text(const Case& what) {
  const std::size_t tests = what.tests.size(), soils = what.ground.variants.size();
  std::string text = what.file.empty() ? "The case is valid" : what.file.string() + " is valid";
  text += fmt::format(": {} on {}, {}.\n", plural(tests, "test", "tests"),
                      plural(soils, "reading of the soil", "readings of the soil"),
                      plural(tests * soils, "virtual test", "virtual tests"));
  if (!what.job.empty()) text += fmt::format("Job: {}\n", what.job);
  text += "\nTests\n";
  for (const Test& test : what.tests) text += test_words(test);
  text += "\nGround\n";
  text += ground_words(what);
  text += "\n" + warning_lines(what) + assumed_lines(what);
  const double duration = rough_duration(what);
  const std::string time = duration < 1.0 ? "less than a second" : "about " + about_time(duration);
  return text + "\n" +
         paragraph(fmt::format("Accuracy asked for: {}. Computing takes roughly: {}; several times "
                               "that where a sharp front creeps, in fine dry soil under a wide "
                               "ring.",
                               given_percent(what.accuracy), time),
                   "", "  ");
}

}  // namespace ringwright::cases
