#include "cases/input/schema_heads.hpp"

namespace ringwright::cases {
namespace {

Range head_range() { return {0.0, 5.0, "0 cm to 5 m"}; }
Range time_range() { return {1.0, 3.6e6, "1 s to 1000 h"}; }

Key ramp_key() {
  return {.name = "ramp",
          .kind = ValueKind::quantity,
          .meaning = "Time a change of head takes; 5 s if not given.",
          .examples = {"5 s"},
          .dimension = Dimension::time,
          .range = Range{0.0, 3600.0, "0 s to 1 h"}};
}

Key step_down_key() {
  return {.name = "step down",
          .kind = ValueKind::choice,
          .also_called = {"lowered by"},
          .meaning =
              "How a lower head is reached: fall (wait for the soil), bail, or bleed under a "
              "lid; fall in an open ring, bleed under a lid if not given.",
          .examples = {"fall"},
          .choices = {"fall", "bail", "bleed"}};
}

Key refill_key() {
  return {.name = "refill below",
          .kind = ValueKind::quantity,
          .meaning = "A falling head that has sunk to this is filled up again to where it began.",
          .examples = {"10 cm"},
          .dimension = Dimension::head,
          .range = head_range()};
}

Key fall_key() {
  return {.name = "fall",
          .kind = ValueKind::phrase,
          .also_called = {"falling head", "falls", "free fall"},
          .meaning = "Falling head: from a depth, and if wanted to another or for a time.",
          .examples = {"from 20 cm", "from 20 cm to 5 cm", "from 20 cm for 1 h"},
          .dimension = Dimension::head,
          .range = Range{0.001, 5.0, "1 mm to 5 m"}};
}

Key head_key() {
  return {.name = "head",
          .kind = ValueKind::quantity,
          .also_called = {"ponding", "ponding depth", "water depth", "level"},
          .meaning = "Constant depth of water in the ring.",
          .examples = {"5 cm"},
          .dimension = Dimension::head,
          .range = head_range()};
}

Key stages_grammar() {
  Key stages{.name = "stages", .kind = ValueKind::sections, .also_called = {"steps", "phases"}};
  stages.meaning =
      "What is done one after the other: each a constant head, a fall, or a soak that is not read.";
  stages.keys = {
      head_key(),
      fall_key(),
      {.name = "soak",
       .kind = ValueKind::quantity,
       .meaning = "Constant head that wets the ground before the test proper and is not read.",
       .examples = {"5 cm"},
       .dimension = Dimension::head,
       .range = head_range()},
      {.name = "for",
       .kind = ValueKind::quantity,
       .also_called = {"duration", "each for", "time"},
       .meaning = "How long the stage lasts.",
       .examples = {"20 min"},
       .dimension = Dimension::time,
       .range = time_range()},
      ramp_key(),
      step_down_key(),
      refill_key(),
  };
  return stages;
}

}  // namespace

std::vector<Key> head_keys() {
  Key head = head_key();
  head.required = true;
  head.or_else = {"heads", "fall", "stages"};
  return {
      head,
      {.name = "heads",
       .kind = ValueKind::phrase,
       .meaning = "Constant heads one after the other, how long each, how often all of them.",
       .examples = {"5 cm then 15 cm", "5 cm then 15 cm, each for 20 min, 2 times",
                    "15 cm for 1 h then 5 cm for 2 h"},
       .dimension = Dimension::head,
       .range = head_range()},
      fall_key(),
      stages_grammar(),
      {.name = "soak",
       .kind = ValueKind::phrase,
       .also_called = {"presoak", "soak first", "prewet"},
       .meaning = "Constant head that wets the ground first and is not read.",
       .examples = {"5 cm for 30 min"},
       .dimension = Dimension::head,
       .range = head_range()},
      {.name = "outer head",
       .kind = ValueKind::quantity,
       .meaning = "Constant head in the outer ring; as in the inner one if not given.",
       .examples = {"5 cm"},
       .dimension = Dimension::head,
       .range = head_range()},
      {.name = "pressure",
       .kind = ValueKind::phrase,
       .also_called = {"pressures"},
       .meaning = "Pressure under the lid, on top of the depth 'head': one, or several as in "
                  "'heads'. The head at the soil is depth plus pressure.",
       .examples = {"40 cm", "4 kPa then 12 kPa, each for 30 min"},
       .dimension = Dimension::head,
       .range = Range{0.0, 20.0, "0 cm to 20 m"}},
      {.name = "pressed by",
       .kind = ValueKind::phrase,
       .meaning = "What presses the water under the lid: a water standpipe, or air.",
       .examples = {"standpipe 5 cm wide", "air"},
       .dimension = Dimension::length,
       .range = Range{0.002, 2.0, "2 mm to 2 m"}},
      {.name = "falls in",
       .kind = ValueKind::phrase,
       .also_called = {"falling in"},
       .meaning = "Where the level falls, if not in the ring: in a standpipe on the lid, or in a "
                  "tank joined to an open ring.",
       .examples = {"standpipe 5 cm wide", "tank 40 cm wide"},
       .dimension = Dimension::length,
       .range = Range{0.002, 4.0, "2 mm to 4 m"}},
      refill_key(),
      ramp_key(),
      step_down_key(),
      {.name = "incident",
       .kind = ValueKind::phrases,
       .also_called = {"incidents"},
       .meaning = "A time without water in a ring: tipped out, leaked away, forgotten.",
       .examples = {"outer ring empty from 1 h 10 min to 1 h 40 min"},
       .dimension = Dimension::time,
       .range = Range{0.0, 3.6e6, "0 s to 1000 h"}},
  };
}

}  // namespace ringwright::cases
