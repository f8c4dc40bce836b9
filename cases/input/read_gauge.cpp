#include "cases/input/read_gauge.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>
#include <numbers>

#include "cases/input/phrase_parts.hpp"
#include "cases/input/read_supply.hpp"

namespace ringwright::cases {
namespace {

constexpr double usual_tube = 0.05;   // [m] wide; common practice, no source
constexpr double weighed_bag = 1e-6;  // [m3] of a bag weighed to 1 g

double tube(double division, double width) {
  return division * std::numbers::pi * width * width / 4;
}

// "10 mL" or "1 mm in a 10 cm tube" [m3]
std::optional<double> read_division(const SectionReader& section, Reading& reading) {
  const auto text = section.text("gauge");
  if (!text) return std::nullopt;
  const auto halves = split(*text, " in a ");
  if (halves.size() == 1) return section.quantity_in("gauge", halves[0]);
  std::string_view width = halves[1];
  take_back(width, " tube");
  const auto level = part(section, "gauge", halves[0], Dimension::length,
                          {1e-5, 0.1, "0.01 mm to 10 cm"}, reading);
  const auto diameter =
      part(section, "gauge", width, Dimension::length, {0.001, 2.0, "1 mm to 2 m"}, reading);
  if (!level || !diameter) return std::nullopt;
  return tube(*level, *diameter);
}

bool falls(const Test& test) {
  return std::any_of(
      test.program.stages.begin(), test.program.stages.end(),
      [](const models::Stage& stage) { return stage.kind == models::StageKind::free_fall; });
}

// A falling level is itself what is read; water that is added comes out of a tube.
void assume_division(const SectionReader& own, Test& test, Reading& reading) {
  Reader& reader = test.reader;
  std::string words;
  if (test.sealed_volume) {
    reader.volume_division = weighed_bag;
    words = "water read to 1 mL, a bag weighed to 1 g";
  } else if (falls(test)) {
    reader.volume_by_level = true;
    reader.volume_division = test.ruler * vessel_area(test);
    words = fmt::format("water read by the falling level, {:.2g} mL a division",
                        1e6 * reader.volume_division);
  } else {
    reader.volume_division = tube(test.ruler, usual_tube);
    words = fmt::format("water read to {:.2g} mL, {:g} mm in a tube {:g} cm wide",
                        1e6 * reader.volume_division, 1e3 * test.ruler, 100 * usual_tube);
  }
  reading.assume(own.path_of("gauge"), words);
}

}  // namespace

void read_gauge(const TestSection& section, Test& test, Reading& reading) {
  Reader& reader = test.reader;
  if (section.has("gauge")) {
    reader.volume_division = read_division(section.with("gauge"), reading).value_or(0.0);
  } else {
    assume_division(section.own, test, reading);
  }
  const auto error = section.with("reading error").quantity("reading error");
  reader.random_error = error.value_or(0.0);
  if (!section.has("reading error"))
    reading.assume(section.own.path_of("reading error"), "no random reading error");
  const SectionReader& seeded = section.with("seed");
  const auto seed = seeded.quantity("seed");
  if (seed && *seed != std::floor(*seed)) seeded.problem("seed", "a whole number is needed");
  reader.seed = static_cast<int>(seed.value_or(1.0));
  if (!section.has("seed") && reader.random_error > 0)
    reading.assume(section.own.path_of("seed"), "seed 1");
}

}  // namespace ringwright::cases
