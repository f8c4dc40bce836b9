#include "cases/input/read_rings.hpp"

#include <fmt/format.h>

namespace ringwright::cases {
namespace {

std::string_view ring_key(const SectionReader& section) {
  return section.has("ring") ? "ring" : "inner ring";
}

double read_insert(const SectionReader& section, std::string_view key) {
  constexpr double shallowest = 0.005;
  const auto insert = section.quantity(key);
  if (insert && *insert > 0 && *insert < shallowest * (1 - 1e-12)) {
    section.problem(
        key, fmt::format("{} is neither 0 nor at least 0.5 cm", section.text(key).value_or("")),
        "so shallow a wall leaks under its foot: give 0 cm, or 0.5 cm and more");
  }
  return insert.value_or(0.0);
}

void read_inner(const SectionReader& section, Test& test, Reading& reading) {
  if (section.has("ring") && section.has("inner ring")) {
    reading.contradiction(section.key_place("inner ring"),
                          section.front_of("inner ring") + "the diameter is given twice",
                          section.key_place("ring"), "also given here", "keep one of the two");
  }
  test.ring.radius = section.quantity(ring_key(section)).value_or(0.0) / 2;
  test.ring.insertion = read_insert(section, "insert");
}

void read_wall(const SectionReader& section, Test& test, Reading& reading) {
  const auto wall = section.quantity("wall");
  // Driven in, a wall of any thickness is the same to the flow; on the surface it covers a strip.
  if (!section.has("wall") && test.ring.insertion == 0.0)
    reading.assume(section.path_of("wall"), fmt::format("wall {:g} mm", 1e3 * test.wall_thickness));
  test.wall_thickness = wall.value_or(test.wall_thickness);
  test.ring.wall = test.wall_thickness;
  if (wall && test.ring.radius > 0 && *wall >= test.ring.radius) {
    reading.contradiction(section.value_place("wall"),
                          section.front_of("wall") + "the wall is as thick as the ring is wide",
                          section.value_place(ring_key(section)), "the ring's inner diameter");
  }
}

// Keys that mean nothing without an outer ring.
void refuse_without_outer(const SectionReader& section, Reading& reading) {
  for (const std::string_view key : {"outer insert", "outer head", "sealed"}) {
    if (!section.has(key)) continue;
    reading.problem(section.key_place(key), section.front_of(key) + "there is no outer ring",
                    "for example  outer ring: 60 cm");
  }
}

void read_outer(const SectionReader& section, Test& test, Reading& reading) {
  if (!section.has("outer ring")) {
    if (!section.is_suggested("outer ring")) refuse_without_outer(section, reading);
    return;
  }
  models::SingleRing outer;
  outer.radius = section.quantity("outer ring").value_or(0.0) / 2;
  outer.wall = test.wall_thickness;
  if (section.has("outer insert")) {
    outer.insertion = read_insert(section, "outer insert");
  } else {
    outer.insertion = test.ring.insertion;
    reading.assume(section.path_of("outer insert"),
                   fmt::format("outer ring as deep as the inner, {:g} cm", 100 * outer.insertion));
  }
  test.outer_ring = outer;
  const double inner = test.ring.radius + test.wall_thickness;
  if (outer.radius == 0.0 || test.ring.radius == 0.0 || outer.radius > inner + 1e-9) return;
  reading.contradiction(section.value_place("outer ring"),
                        section.front_of("outer ring") + "the outer ring is inside the inner one",
                        section.value_place(ring_key(section)), "diameter of the inner ring",
                        "usual is twice the diameter of the inner ring");
}

void read_seal(const SectionReader& section, Test& test, Reading& reading) {
  if (!section.has("sealed") && section.has("sealed volume")) {
    reading.problem(section.key_place("sealed volume"),
                    section.front_of("sealed volume") + "no ring is sealed",
                    "write  sealed: inner ring");
  }
  if (section.has("sealed") && section.text("sealed"))
    test.sealed_volume = section.quantity("sealed volume").value_or(0.0);
  if (section.has("sealed") && section.has("lid")) {
    reading.contradiction(
        section.key_place("lid"), section.front_of("lid") + "a sealed inner ring has its own cover",
        section.key_place("sealed"), "sealed here", "a lid is for a ring under pressure: keep one");
  }
}

void too_high(const SectionReader& section, const Place& place, const Test& test, double freeboard,
              Reading& reading) {
  const std::string less =
      freeboard > 0 ? fmt::format(", less a freeboard of {:.3g} cm", 100 * freeboard) : "";
  reading.contradiction(
      place,
      fmt::format("{}the ring stands only {:.3g} cm out of the ground{}",
                  section.has("head") ? section.front_of("head") : section.front(),
                  100 * (*test.height - test.ring.insertion), less),
      section.value_place("height"), "height of the ring",
      "the height goes from the foot of the wall to its rim");
}

}  // namespace

void read_rings(const SectionReader& section, Test& test, Reading& reading) {
  read_inner(section, test, reading);
  read_wall(section, test, reading);
  read_outer(section, test, reading);
  read_seal(section, test, reading);
  test.height = section.quantity("height");
}

void check_height(const SectionReader& section, const Test& test, const HeadWords& heads,
                  Reading& reading) {
  const double freeboard = section.quantity("freeboard").value_or(0.0);
  if (!test.height) return;
  if (!section.has("freeboard") && !test.lid)
    reading.assume(section.path_of("freeboard"), "no freeboard above the water");
  if (section.has("insert") && test.ring.insertion >= *test.height) {
    reading.contradiction(section.value_place("insert"),
                          section.front_of("insert") + "deeper than the ring is high",
                          section.value_place("height"), "height of the ring",
                          "the height goes from the foot of the wall to its rim");
    return;
  }
  const double room = *test.height - test.ring.insertion - freeboard;
  if (test.lid) {
    if (test.lid->underside <= room + freeboard + 1e-9) return;
    const Place place = section.has("pressure") && section.has("head") ? section.value_place("head")
                                                                       : section.key_place("lid");
    too_high(section, place, test, 0.0, reading);
    return;
  }
  for (const StageWords& stage : heads.stages) {
    if (stage.stage.head <= room + 1e-9) continue;
    too_high(section, stage.place, test, freeboard, reading);
    return;
  }
}

}  // namespace ringwright::cases
