#include "cases/input/schema_tests.hpp"

#include "cases/input/schema_heads.hpp"
#include "cases/input/schema_protocol.hpp"

namespace ringwright::cases {
namespace {

Key lid_grammar() {
  Key section{.name = "lid", .kind = ValueKind::section, .also_called = {"cap", "cover"}};
  section.meaning =
      "A lid on the ring, under which the water is pressed. Lids, relief and ballast are designed "
      "by a competent person; local rules for pressure equipment hold.";
  section.keys = {
      {.name = "depth",
       .kind = ValueKind::quantity,
       .meaning = "Depth of the water under the lid.",
       .examples = {"10 cm"},
       .dimension = Dimension::length,
       .range = Range{0.001, 2.0, "1 mm to 2 m"}},
      {.name = "seal",
       .kind = ValueKind::quantity,
       .also_called = {"seal diameter", "diameter"},
       .meaning = "Diameter out to the seal, which the lift acts on; the ring's if not given.",
       .examples = {"32 cm"},
       .dimension = Dimension::length,
       .range = Range{0.02, 5.0, "2 cm to 5 m"}},
      {.name = "relief",
       .kind = ValueKind::quantity,
       .also_called = {"overflow", "relief valve"},
       .meaning = "Highest head above the ground that relief valve or overflow lets stand.",
       .examples = {"1.2 m"},
       .dimension = Dimension::head,
       .range = Range{0.01, 20.0, "1 cm to 20 m"}},
      {.name = "supply pressure",
       .kind = ValueKind::quantity,
       .also_called = {"pump pressure", "line pressure"},
       .meaning = "Head the supply can reach with pump and valve failed open.",
       .examples = {"3 bar"},
       .dimension = Dimension::head,
       .range = Range{0.01, 200.0, "1 cm to 200 m"}},
      {.name = "rating",
       .kind = ValueKind::quantity,
       .also_called = {"rated", "rated for"},
       .meaning = "Highest pressure the lid is rated for.",
       .examples = {"20 kPa"},
       .dimension = Dimension::head,
       .range = Range{0.01, 200.0, "1 cm to 200 m"}},
      {.name = "weight",
       .kind = ValueKind::quantity,
       .also_called = {"mass"},
       .meaning = "Weight of lid and ring.",
       .examples = {"12 kg"},
       .dimension = Dimension::mass,
       .range = Range{0.0, 5000.0, "0 kg to 5000 kg"}},
      {.name = "ballast factor",
       .kind = ValueKind::number,
       .meaning = "Ballast over lift that is asked for; 1.5 if not given.",
       .examples = {"1.5"},
       .range = Range{1.0, 10.0, "1 to 10"}},
  };
  return section;
}

Range diameter_range() { return {0.02, 10.0, "2 cm to 10 m"}; }

std::vector<Key> ring_keys() {
  return {
      {.name = "ring",
       .kind = ValueKind::quantity,
       .also_called = {"diameter", "inner diameter", "radius", "size"},
       .meaning = "Inner diameter of the ring.",
       .examples = {"30 cm"},
       .dimension = Dimension::length,
       .range = Range{0.02, 4.0, "2 cm to 4 m"},
       .required = true,
       .or_else = {"inner ring"}},
      {.name = "insert",
       .kind = ValueKind::quantity,
       .also_called = {"insertion", "depth", "driven", "driven in"},
       .meaning = "How deep the wall stands in the ground: 0 cm, or 0.5 cm and more.",
       .examples = {"10 cm"},
       .dimension = Dimension::length,
       .range = Range{0.0, 1.0, "0 cm, or 0.5 cm to 1 m"},
       .required = true},
      {.name = "inner ring",
       .kind = ValueKind::quantity,
       .meaning = "Inner diameter of the inner ring of a double ring; the same as 'ring'.",
       .examples = {"30 cm"},
       .dimension = Dimension::length,
       .range = Range{0.02, 4.0, "2 cm to 4 m"}},
      {.name = "outer ring",
       .kind = ValueKind::quantity,
       .also_called = {"outer diameter", "buffer ring", "outer"},
       .meaning = "Inner diameter of the outer ring of a double ring.",
       .examples = {"60 cm"},
       .dimension = Dimension::length,
       .range = diameter_range()},
      {.name = "outer insert",
       .kind = ValueKind::quantity,
       .meaning = "How deep the outer wall stands in the ground; as the inner one if not given.",
       .examples = {"15 cm"},
       .dimension = Dimension::length,
       .range = Range{0.0, 1.0, "0 cm, or 0.5 cm to 1 m"}},
      {.name = "sealed",
       .kind = ValueKind::choice,
       .meaning = "The inner ring is closed and its flow read by volume, as on liners.",
       .examples = {"inner ring"},
       .choices = {"inner ring"}},
      {.name = "sealed volume",
       .kind = ValueKind::quantity,
       .meaning = "Water inside the closed inner ring and its bag; area times head if not given.",
       .examples = {"500 L"},
       .dimension = Dimension::volume,
       .range = Range{1e-5, 100.0, "10 mL to 100 m3"}},
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
      {.name = "freeboard",
       .kind = ValueKind::quantity,
       .meaning = "Wall that must stay above the water; 0 if not given.",
       .examples = {"3 cm"},
       .dimension = Dimension::length,
       .range = Range{0.0, 1.0, "0 cm to 1 m"}},
      lid_grammar(),
  };
}

}  // namespace

Key tests_grammar() {
  Key section{.name = "tests", .kind = ValueKind::section, .required = true};
  section.meaning = "One or more ring tests by names of your own, and what holds for all of them.";
  section.examples = {"{ one head: { ring: 30 cm, insert: 10 cm, head: 5 cm } }"};
  section.keys = protocol_keys();
  section.named = ring_keys();
  for (const auto& keys : {head_keys(), protocol_keys()})
    section.named.insert(section.named.end(), keys.begin(), keys.end());
  return section;
}

}  // namespace ringwright::cases
