#include "cases/input/schema_ground.hpp"

#include "cases/input/schema_soil.hpp"

namespace ringwright::cases {
namespace {

Range depth_range(double least, const char* words) { return {least, 100.0, words}; }

Key layers_grammar() {
  Key layers{.name = "layers", .kind = ValueKind::sections, .also_called = {"layer", "horizons"}};
  layers.meaning =
      "Layers below the soil above, each from its depth below ground down to the next; without a "
      "soil above, the first is the uppermost.";
  layers.examples = {"clay loam from 5 ft down"};
  layers.keys = {
      {.name = "name",
       .kind = ValueKind::text,
       .meaning = "What to call this layer on the results.",
       .examples = {"liner"}},
      {.name = "from",
       .kind = ValueKind::quantity,
       .also_called = {"top", "below", "starts at"},
       .meaning = "Depth of its upper edge below the surface of the ground.",
       .examples = {"40 cm"},
       .dimension = Dimension::length,
       .range = depth_range(0.0, "0 cm to 100 m")},
  };
  const auto soil = soil_keys();
  layers.keys.insert(layers.keys.end(), soil.begin(), soil.end());
  return layers;
}

Key disturbed_grammar() {
  Key section{.name = "disturbed", .kind = ValueKind::section, .also_called = {"smeared"}};
  section.meaning =
      "Soil disturbed by driving the ring, on both sides of the wall down to its foot.";
  section.keys = {
      {.name = "width",
       .kind = ValueKind::quantity,
       .meaning = "How far it reaches from the wall.",
       .examples = {"1 cm"},
       .dimension = Dimension::length,
       .range = Range{0.001, 0.2, "1 mm to 20 cm"},
       .required = true},
      {.name = "Ks x",
       .kind = ValueKind::number,
       .also_called = {"factor", "ks"},
       .meaning = "Its conductivity over that of the soil: below 1 smeared, above 1 loosened.",
       .examples = {"0.3"},
       .range = Range{0.001, 1000.0, "0.001 to 1000"},
       .required = true},
  };
  return section;
}

std::vector<Key> place_keys() {
  return {
      {.name = "test level",
       .kind = ValueKind::phrase,
       .also_called = {"level", "test depth", "pit"},
       .meaning = "How deep below ground the ring stands; layers and water table count from the "
                  "ground. 0 if not given.",
       .examples = {"60 cm below ground"},
       .dimension = Dimension::length,
       .range = depth_range(0.0, "0 cm to 100 m")},
      layers_grammar(),
      {.name = "water table",
       .kind = ValueKind::phrase,
       .also_called = {"groundwater", "ground water"},
       .meaning = "Depth of the water table below ground; the ground is hydrostatic to it.",
       .examples = {"2 m"},
       .dimension = Dimension::length,
       .range = depth_range(0.02, "2 cm to 100 m")},
      disturbed_grammar(),
      {.name = "wall gap",
       .kind = ValueKind::quantity,
       .also_called = {"gap", "leak"},
       .meaning = "Width of an open gap along both sides of the wall; none if not given.",
       .examples = {"0.05 mm"},
       .dimension = Dimension::length,
       .range = Range{1e-5, 2e-3, "0.01 mm to 2 mm"}},
      {.name = "liner",
       .kind = ValueKind::quantity,
       .meaning = "Thickness of a liner from the level of the test down, for the share of it that "
                  "the ring pierces.",
       .examples = {"60 cm"},
       .dimension = Dimension::length,
       .range = Range{0.01, 20.0, "1 cm to 20 m"}},
      {.name = "wet density",
       .kind = ValueKind::quantity,
       .also_called = {"bulk density", "density", "unit weight"},
       .meaning = "Density of the ground with its water, which holds against the pressure at the "
                  "foot of the wall.",
       .examples = {"1.9 kg/L"},
       .dimension = Dimension::density,
       .range = Range{800.0, 3000.0, "800 kg/m3 to 3000 kg/m3"}},
      {.name = "true Kfs of",
       .kind = ValueKind::text,
       .also_called = {"truth", "true kfs"},
       .meaning = "Name of the layer whose Kfs is the true one; that holding the foot of the wall "
                  "if not given.",
       .examples = {"liner"}},
  };
}

}  // namespace

Key ground_grammar() {
  Key section{.name = "ground", .kind = ValueKind::section, .required = true};
  section.meaning =
      "The ground. The soil is given in one of three ways: texture; parameters; capillary length "
      "or alpha star with fillable porosity and Kfs.";
  section.examples = {"{ texture: silt loam }"};
  section.keys = {
      {.name = "name",
       .kind = ValueKind::text,
       .meaning = "What to call this soil on the results.",
       .examples = {"upper terrace"}},
      {.name = "water",
       .kind = ValueKind::quantity,
       .also_called = {"temperature", "water temperature"},
       .meaning = "Temperature of the water in the test; 20 degC if not given.",
       .examples = {"10 degC"},
       .dimension = Dimension::temperature,
       .range = Range{0.0, 50.0, "0 degC to 50 degC"}},
      {.name = "specific storage",
       .kind = ValueKind::quantity,
       .also_called = {"ss", "storage"},
       .meaning = "Storage of saturated soil per height of pressure; 0 if not given.",
       .examples = {"0 1/m"},
       .dimension = Dimension::per_head,
       .range = Range{0.0, 0.1, "0 1/m to 0.1 1/m"}},
  };
  const auto soil = soil_keys();
  section.keys.insert(section.keys.begin() + 2, soil.begin(), soil.end());
  const auto place = place_keys();
  section.keys.insert(section.keys.end(), place.begin(), place.end());
  return section;
}

}  // namespace ringwright::cases
