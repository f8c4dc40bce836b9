#include "cases/input/read_tests.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/input/read_heads.hpp"
#include "cases/input/read_lid.hpp"
#include "cases/input/read_protocol.hpp"
#include "cases/input/read_rings.hpp"
#include "cases/input/suggestion.hpp"

namespace ringwright::cases {
namespace {

// A wall must not reach what the ground keeps for itself.
void check_depth(const SectionReader& section, std::string_view key, double insertion,
                 const GroundRead& read, Reading& reading) {
  if (!section.has(key)) return;
  const auto check = [&](const std::optional<double>& depth, const std::optional<Place>& place,
                         std::string_view message, std::string_view note) {
    if (!depth || !place || insertion < *depth) return;
    reading.contradiction(section.value_place(key), section.front_of(key) + std::string(message),
                          *place, std::string(note));
  };
  check(read.ground.water_table, read.places.water_table, "the wall stands in the water table",
        "the water table");
  check(read.ground.liner, read.places.liner, "the wall goes through the liner",
        "thickness of the liner");
}

Test read_test(const LocatedNode::Entry& entry, const Key& grammar, const SectionReader& common,
               const GroundRead& ground, Reading& reading) {
  Test test;
  test.name = entry.first.text;
  const SectionReader section(entry.second, grammar.named, "tests." + test.name, entry.first.place,
                              reading);
  if (section.is_broken()) return test;
  read_rings(section, test, reading);
  read_lid(section, test, reading);
  const HeadWords heads = read_heads(section, test.lid ? test.lid->underside : 0.0, reading);
  if (heads.ok) {
    check_height(section, test, heads, reading);
    check_lid(section, test, heads, reading);
  }
  check_depth(section, "insert", test.ring.insertion, ground, reading);
  if (test.outer_ring)
    check_depth(section, "outer insert", test.outer_ring->insertion, ground, reading);
  if (test.lid && !ground.ground.wet_density)
    reading.assume("ground.wet density",
                   "ground as heavy as grains of 2650 kg/m3 with pores full, at least 40 % of it");
  read_protocol({section, common}, heads, test, reading);
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
                             const GroundRead& ground, Reading& reading) {
  std::vector<Test> tests;
  const SectionReader section(node, grammar.keys, "tests", where, reading, true);
  if (section.is_broken()) return tests;
  for (const auto* entry : section.named()) {
    if (looks_like_test(*entry, grammar, reading)) {
      tests.push_back(read_test(*entry, grammar, section, ground, reading));
    }
  }
  if (section.named().empty()) {
    reading.problem(where, "tests: no test is described",
                    "for example  one head: { ring: 30 cm, insert: 10 cm, head: 5 cm }");
  }
  return tests;
}

}  // namespace ringwright::cases
