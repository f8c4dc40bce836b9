#include "cases/input/read_supply.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <numbers>

#include "cases/input/phrase_parts.hpp"

namespace ringwright::cases {
namespace {

double disc(double radius) { return std::numbers::pi * radius * radius; }

void read_when_empty(const TestSection& section, models::Supply& supply, Reading& reading) {
  constexpr std::string_view key = "when empty";
  const SectionReader& where = section.with(key);
  const auto text = where.text(key);
  if (!text) return;
  std::string_view words = *text;
  if (words == "goes on") {
    supply.when_empty = models::WhenEmpty::go_on;
  } else if (words == "stops") {
    supply.when_empty = models::WhenEmpty::stop;
  } else if (take_front(words, "refilled in ")) {
    supply.when_empty = models::WhenEmpty::refill;
    supply.refill_time =
        part(where, key, words, Dimension::time, {0.0, 3.6e6, "0 s to 1000 h"}, reading)
            .value_or(0.0);
  } else {
    where.problem(key, fmt::format("'{}' is not understood", *text),
                  "write goes on, stops, or for example: refilled in 20 min");
  }
  if (!section.has("reservoir")) {
    reading.problem(where.key_place(key), where.front_of(key) + "there is no reservoir to empty",
                    "for example  reservoir: 200 L");
  }
}

void assume_rest(const TestSection& section, const Test& test, Reading& reading) {
  const SectionReader& own = section.own;
  if (!section.has("supply") && !section.has("reservoir"))
    reading.assume(own.path_of("supply"), "supply as large as the soil drinks, never empty");
  if (section.has("reservoir") && !section.has("when empty"))
    reading.assume(own.path_of("when empty"), "the test goes on when the reservoir is empty");
  if (test.outer_ring && (section.has("supply") || section.has("reservoir")))
    reading.assume(own.path_of("supply"), "inner and outer ring each have such a supply");
  if (!section.has("evaporation") && !test.lid)
    reading.assume(own.path_of("evaporation"), "no evaporation from the open water");
}

}  // namespace

void read_supply(const TestSection& section, Test& test, Reading& reading) {
  models::Supply supply;
  supply.largest_rate = section.with("supply").quantity("supply");
  supply.reservoir = section.with("reservoir").quantity("reservoir");
  read_when_empty(section, supply, reading);
  test.program.supply = supply;
  if (test.outer_ring) test.outer.supply = supply;
  test.evaporation = section.with("evaporation").quantity("evaporation").value_or(0.0);
  assume_rest(section, test, reading);
}

double vessel_area(const Test& test) {
  const double ring = disc(test.ring.radius), vessel = disc(test.vessel_diameter / 2);
  if (test.vessel == VesselKind::standpipe) return vessel;
  if (test.vessel == VesselKind::tank) return ring + vessel;
  return test.vessel == VesselKind::air ? 0.0 : ring;
}

double filling_volume(const Test& test, double head) {
  const double depth = test.lid ? test.lid->underside : 0.0;
  return disc(test.ring.radius) * depth + vessel_area(test) * std::max(0.0, head - depth);
}

void warn_of_small_reservoir(const TestSection& section, const Test& test, Reading& reading) {
  const auto reservoir = test.program.supply.reservoir;
  if (!reservoir) return;
  double head = test.protocol.head;
  for (const models::Stage& stage : test.program.stages) head = std::max(head, stage.head);
  double filling = filling_volume(test, head);
  if (test.outer_ring) {
    const double outer = disc(test.outer_ring->radius) - disc(test.ring.radius);
    filling = std::max(filling, outer * head);
  }
  if (*reservoir >= filling) return;
  reading.warn(section.with("reservoir").path_of("reservoir"),
               fmt::format("{:.3g} L do not even fill the ring of {}, which takes {:.3g} L",
                           1e3 * *reservoir, test.name, 1e3 * filling));
}

}  // namespace ringwright::cases
