#include "cases/input/read_tests.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/input/read_protocol.hpp"
#include "cases/input/suggestion.hpp"

namespace ringwright::cases {
namespace {

void read_insert(const SectionReader& section, Test& test) {
  const auto insert = section.quantity("insert");
  if (!insert) return;
  constexpr double shallowest = 0.005;
  if (*insert > 0 && *insert < shallowest * (1 - 1e-12)) {
    section.problem(
        "insert",
        fmt::format("{} is neither 0 nor at least 0.5 cm", section.text("insert").value_or("")),
        "so shallow a wall leaks under its foot: give 0 cm, or 0.5 cm and more");
  }
  test.ring.insertion = *insert;
}

void read_wall(const SectionReader& section, Test& test, Reading& reading) {
  const auto wall = section.quantity("wall");
  if (!section.has("wall")) {
    // Driven in, a wall of any thickness is the same to the flow; on the surface it covers a strip.
    if (test.ring.insertion == 0.0)
      reading.assume(section.path_of("wall"),
                     fmt::format("wall {:g} mm", 1e3 * test.wall_thickness));
  }
  test.wall_thickness = wall.value_or(test.wall_thickness);
  test.ring.wall = test.wall_thickness;
  if (wall && test.ring.radius > 0 && *wall >= test.ring.radius) {
    reading.contradiction(section.value_place("wall"),
                          section.front_of("wall") + "the wall is as thick as the ring is wide",
                          section.value_place("ring"), "the ring's inner diameter");
  }
}

// A ring cannot stand deeper than it is high, nor hold more water than stands out of the ground.
void check_height(const SectionReader& section, const Test& test, Reading& reading) {
  const auto height = section.quantity("height");
  if (!height) return;
  if (section.has("insert") && test.ring.insertion >= *height) {
    reading.contradiction(section.value_place("insert"),
                          section.front_of("insert") + "deeper than the ring is high",
                          section.value_place("height"), "height of the ring",
                          "the height goes from the foot of the wall to its rim");
  } else if (section.has("head") && test.ring.insertion + test.protocol.head > *height) {
    reading.contradiction(
        section.value_place("head"),
        fmt::format("{}the ring stands only {:.3g} cm out of the ground", section.front_of("head"),
                    100 * (*height - test.ring.insertion)),
        section.value_place("height"), "height of the ring",
        "the height goes from the foot of the wall to its rim");
  }
}

Test read_test(const LocatedNode::Entry& entry, const Key& grammar, const ProtocolWords& common,
               Reading& reading) {
  Test test;
  test.name = entry.first.text;
  const SectionReader section(entry.second, grammar.named, "tests." + test.name, entry.first.place,
                              reading);
  if (section.is_broken()) return test;
  test.ring.radius = section.quantity("ring").value_or(0.0) / 2;
  read_insert(section, test);
  test.protocol.head = section.quantity("head").value_or(0.0);
  read_wall(section, test, reading);
  check_height(section, test, reading);
  apply_protocol(section, read_protocol(section, reading), common, test, reading);
  return test;
}

// A scalar under a name is rather a misspelt key than a test.
bool looks_like_test(const LocatedNode::Entry& entry, const Key& grammar, Reading& reading) {
  const auto& [key, value] = entry;
  if (value.kind == LocatedNode::Kind::map) return true;
  std::vector<std::string> names;
  for (const auto* keys : {&grammar.keys, &grammar.named}) {
    for (const Key& candidate : *keys) names.push_back(candidate.name);
  }
  const auto near = nearest(key.text, names);
  reading.problem(key.place,
                  fmt::format("tests: '{}' is neither a test (a block of keys ring, insert, head) "
                              "nor a key for all tests",
                              key.text),
                  near ? fmt::format("did you mean '{}'?", *near)
                       : "for example  one head: { ring: 30 cm, insert: 10 cm, head: 5 cm }");
  return false;
}

}  // namespace

std::vector<Test> read_tests(const LocatedNode& node, const Place& where, const Key& grammar,
                             Reading& reading) {
  std::vector<Test> tests;
  const SectionReader section(node, grammar.keys, "tests", where, reading, true);
  if (section.is_broken()) return tests;
  const ProtocolWords common = read_protocol(section, reading);
  for (const auto* entry : section.named()) {
    if (looks_like_test(*entry, grammar, reading)) {
      tests.push_back(read_test(*entry, grammar, common, reading));
    }
  }
  if (section.named().empty()) {
    reading.problem(where, "tests: no test is described",
                    "for example  one head: { ring: 30 cm, insert: 10 cm, head: 5 cm }");
  }
  return tests;
}

}  // namespace ringwright::cases
