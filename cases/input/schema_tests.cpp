#include "cases/input/schema_tests.hpp"

namespace ringwright::cases {
namespace {

// May stand in a test or, for all tests that do not name it, beside them.
std::vector<Key> protocol_keys() {
  return {
      {.name = "stop",
       .kind = ValueKind::phrase,
       .also_called = {"duration", "end", "for", "until"},
       .meaning = "When the crew stops: after a time, or when the last readings agree.",
       .examples = {"3 readings within 5 %, or 8 h", "after 6 h"},
       .dimension = Dimension::time,
       .range = Range{1.0, 3.6e6, "1 s to 1000 h; a test of no duration yields no reading"}},
      {.name = "read",
       .kind = ValueKind::phrase,
       .also_called = {"interval", "reading interval", "readings"},
       .meaning = "Reading interval, and how finely is read if it is known.",
       .examples = {"every 10 min", "every 10 min, ruler to 1 mm, head kept to 5 mm"},
       .dimension = Dimension::time,
       .range = Range{1.0, 3.6e5, "1 s to 100 h"}},
      {.name = "assumed alpha star",
       .kind = ValueKind::phrase,
       .meaning = "The alpha* the crew puts into its formula; 0.12 1/cm if not given.",
       .examples = {"0.12 1/cm"},
       .dimension = Dimension::per_head,
       .range = Range{0.2, 500.0, "0.002 1/cm to 5 1/cm"}},
  };
}

}  // namespace

Key tests_grammar() {
  Key section{.name = "tests", .kind = ValueKind::section, .required = true};
  section.meaning = "One or more ring tests by names of your own, and what holds for all of them.";
  section.examples = {"{ one head: { ring: 30 cm, insert: 10 cm, head: 5 cm } }"};
  section.keys = protocol_keys();
  section.named = {
      {.name = "ring",
       .kind = ValueKind::quantity,
       .also_called = {"diameter", "inner diameter", "inner ring", "radius", "size"},
       .meaning = "Inner diameter of the ring.",
       .examples = {"30 cm"},
       .dimension = Dimension::length,
       .range = Range{0.02, 4.0, "2 cm to 4 m"},
       .required = true},
      {.name = "insert",
       .kind = ValueKind::quantity,
       .also_called = {"insertion", "depth", "driven", "driven in"},
       .meaning = "How deep the wall stands in the ground: 0 cm, or 0.5 cm and more.",
       .examples = {"10 cm"},
       .dimension = Dimension::length,
       .range = Range{0.0, 1.0, "0 cm, or 0.5 cm to 1 m"},
       .required = true},
      {.name = "head",
       .kind = ValueKind::quantity,
       .also_called = {"ponding", "ponding depth", "water depth", "level"},
       .meaning = "Constant depth of water in the ring.",
       .examples = {"5 cm"},
       .dimension = Dimension::head,
       .range = Range{0.0, 5.0, "0 cm to 5 m"},
       .required = true},
      {.name = "wall",
       .kind = ValueKind::quantity,
       .meaning = "Thickness of the ring's wall; 3 mm if not given.",
       .examples = {"3 mm"},
       .dimension = Dimension::length,
       .range = Range{0.0002, 0.05, "0.2 mm to 5 cm"}},
      {.name = "height",
       .kind = ValueKind::quantity,
       .meaning = "Height of the whole ring, to check that it holds what is asked of it.",
       .examples = {"50 cm"},
       .dimension = Dimension::length,
       .range = Range{0.01, 10.0, "1 cm to 10 m"}},
  };
  const auto protocol = protocol_keys();
  section.named.insert(section.named.end(), protocol.begin(), protocol.end());
  return section;
}

}  // namespace ringwright::cases
