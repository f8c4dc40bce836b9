#include "cases/command/check_test.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <numbers>

#include "cases/command/stage_words.hpp"
#include "cases/input/read_supply.hpp"
#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"

namespace ringwright::cases {
namespace {

using models::StopKind;

std::string in_cm_and_inch(double length) {
  return fmt::format("{} cm ({:.3g} in)", centimetres(length), length / 0.0254);
}

std::string rule_words(const models::StopRule& rule) {
  const std::string preset =
      rule.name.empty()
          ? ""
          : fmt::format(" (\"{}\"{})", rule.name, rule.check_edition ? ", check your edition" : "");
  switch (rule.kind) {
    case StopKind::after_time:
      return "after " + time_text(rule.time) + preset;
    case StopKind::after_volume:
      return fmt::format("after {} L into the ground{}", litres(rule.volume), preset);
    case StopKind::change_within_amount:
      return fmt::format("when {} readings are within {} mm/h of each other{}", rule.readings,
                         mm_per_hour(rule.amount), preset);
    case StopKind::change_within_share:
      break;
  }
  return fmt::format("when {} readings are within {} of their mean{}", rule.readings,
                     given_percent(rule.share), preset);
}

std::string stop_words(const Test& test) {
  const std::string longest = time_text(test.protocol.longest);
  if (test.rule) return fmt::format("stops {}, or after {}", rule_words(*test.rule), longest);
  // A case that was not read from a file may have the share of the mean alone.
  if (!test.protocol.stop) return "stops after " + longest;
  return fmt::format("stops when {} readings are within {} of their mean, or after {}",
                     test.protocol.stop->readings, given_percent(test.protocol.stop->within),
                     longest);
}

std::string head_words(const Test& test) {
  const std::size_t stages = test.program.stages.size();
  if (stages < 2) {
    const bool falls = stages == 1 && test.program.stages[0].kind == models::StageKind::free_fall;
    return fmt::format("{}{}", falls ? "head falling from " : "head ",
                       in_cm_and_inch(test.protocol.head));
  }
  return fmt::format("{} stages", stages);
}

std::string ring_words(const Test& test) {
  return fmt::format(
      "{}: {}ring {} wide, {} into the ground, {}; {}; read every {}; the crew assumes "
      "alpha* {:g} 1/cm",
      test.name, test.sealed_volume ? "sealed " : "", in_cm_and_inch(2.0 * test.ring.radius),
      in_cm_and_inch(test.ring.insertion), head_words(test), stop_words(test),
      time_text(
          test.protocol.reading_interval.value_or(std::max(60.0, 0.05 * test.protocol.longest))),
      test.assumed_alpha_star / 100.0);
}

std::string outer_words(const Test& test) {
  const models::SingleRing& outer = *test.outer_ring;
  std::string head = "water as in the inner ring";
  if (test.outer.stages.size() == 1)
    head = "head " + in_cm_and_inch(test.outer.stages.front().head);
  return fmt::format("outer ring {} wide, {} into the ground, {}", in_cm_and_inch(2 * outer.radius),
                     in_cm_and_inch(outer.insertion), head);
}

std::string lid_words(const Test& test) {
  const models::Lid& lid = *test.lid;
  const auto stated = [](const std::optional<double>& head, std::string_view name) {
    return head ? fmt::format("{} {}", name, in_cm_and_inch(*head))
                : fmt::format("{} not stated", name);
  };
  const std::string by =
      test.vessel == VesselKind::air
          ? "pressed by air"
          : fmt::format("standpipe {} cm wide", centimetres(test.vessel_diameter));
  return fmt::format("lid {} above the soil, {}; {}, {}{}; heads count from the soil",
                     in_cm_and_inch(lid.underside), by, stated(lid.relief_head, "relief at"),
                     stated(lid.rating, "rated for"),
                     lid.weight > 0 ? fmt::format(", {:.3g} kg with its ring", lid.weight) : "");
}

std::string filling_words(const Test& test) {
  double head = test.protocol.head;
  for (const models::Stage& stage : test.program.stages) head = std::max(head, stage.head);
  double volume = filling_volume(test, head);
  if (test.outer_ring) {
    const double a = test.ring.radius, b = test.outer_ring->radius;
    double outer_head = head;
    if (test.outer.stages.size() == 1) outer_head = test.outer.stages.front().head;
    volume += std::numbers::pi * (b * b - a * a) * outer_head;
  }
  return fmt::format("filled to its highest head it holds {} L", litres(volume));
}

std::string gauge_words(const Test& test) {
  const Reader& reader = test.reader;
  std::string text = fmt::format("water read to {} mL", rounded(1e6 * reader.volume_division));
  if (reader.random_error > 0)
    text += fmt::format(", random error {} mL (seed {})", rounded(1e6 * reader.random_error),
                        reader.seed);
  return text;
}

}  // namespace

std::string test_words(const Test& test) {
  std::string text = paragraph(ring_words(test), "  ", "    ");
  const auto add = [&](const std::string& line) { text += paragraph(line, "    ", "      "); };
  if (test.outer_ring) add(outer_words(test));
  if (test.lid) add(lid_words(test));
  for (const std::string& line : stage_words(test.program)) add(line);
  for (const std::string& line : incident_words(test)) add(line);
  if (const std::string supply = supply_words(test.program.supply); !supply.empty()) add(supply);
  if (!test.program.stages.empty() || test.outer_ring) add(filling_words(test));
  if (test.evaporation > 0)
    add(fmt::format("evaporation {} mm/d", rounded(86400e3 * test.evaporation)));
  add(gauge_words(test));
  for (const models::StopRule& rule : test.also_judge) add("also judged: " + rule_words(rule));
  return text;
}

}  // namespace ringwright::cases
