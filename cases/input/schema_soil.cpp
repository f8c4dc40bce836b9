#include "cases/input/schema_soil.hpp"

namespace ringwright::cases {
namespace {

Range conductivity_range() { return {1e-12, 0.05, "1e-12 m/s to 0.05 m/s"}; }

Key parameters_grammar() {
  Key section{.name = "parameters", .kind = ValueKind::section};
  section.meaning =
      "The soil by its hydraulic parameters. van Genuchten: theta_r, theta_s, alpha, n; Durner, "
      "of two pore systems: the same with alpha 2, n 2, weight 2; "
      "Gardner: theta_r, theta_s, alpha; Brooks-Corey: theta_r, theta_s, entry head, lambda; "
      "each with Ks (or Kfs beside it).";
  section.keys = {
      {.name = "curve",
       .kind = ValueKind::choice,
       .meaning = "Family of the curves; van Genuchten if not given.",
       .examples = {"van Genuchten"},
       .choices = {"van Genuchten", "Durner", "Gardner", "Brooks-Corey"}},
      {.name = "theta_r",
       .kind = ValueKind::quantity,
       .meaning = "Residual water content.",
       .examples = {"0.078"},
       .range = Range{0.0, 0.5, "0 to 0.5"},
       .required = true},
      {.name = "theta_s",
       .kind = ValueKind::quantity,
       .meaning = "Water content at saturation.",
       .examples = {"0.43"},
       .range = Range{0.0, 0.95, "above 0, up to 0.95", true},
       .required = true},
      {.name = "alpha",
       .kind = ValueKind::quantity,
       .meaning = "van Genuchten: inverse of a characteristic suction. Gardner: slope of ln K.",
       .examples = {"3.6 1/m"},
       .dimension = Dimension::per_head,
       .range = Range{0.01, 200.0, "0.01 1/m to 200 1/m"}},
      {.name = "n",
       .kind = ValueKind::number,
       .meaning = "van Genuchten's exponent, with m = 1 - 1/n.",
       .examples = {"1.56"},
       .range = Range{1.0, 20.0, "above 1, up to 20", true}},
      {.name = "alpha 2",
       .kind = ValueKind::quantity,
       .meaning = "Durner: alpha of the second pore system.",
       .examples = {"30 1/m"},
       .dimension = Dimension::per_head,
       .range = Range{0.01, 1000.0, "0.01 1/m to 1000 1/m"}},
      {.name = "n 2",
       .kind = ValueKind::number,
       .meaning = "Durner: n of the second pore system.",
       .examples = {"2.5"},
       .range = Range{1.0, 20.0, "above 1, up to 20", true}},
      {.name = "weight 2",
       .kind = ValueKind::quantity,
       .also_called = {"w 2", "weight"},
       .meaning = "Durner: share of the second system in the pore space.",
       .examples = {"0.2"},
       .range = Range{0.001, 0.999, "0.1 % to 99.9 %"}},
      {.name = "l",
       .kind = ValueKind::number,
       .meaning = "Exponent of the pore connectivity; 0.5 if not given.",
       .examples = {"0.5"},
       .range = Range{-2.0, 10.0, "above -2, up to 10", true}},
      {.name = "entry head",
       .kind = ValueKind::quantity,
       .also_called = {"h b", "hb", "entry suction"},
       .meaning = "Brooks-Corey: pressure head at which air enters, negative.",
       .examples = {"-20 cm"},
       .dimension = Dimension::head,
       .range = Range{-10.0, -0.001, "-10 m to -0.1 cm"}},
      {.name = "lambda",
       .kind = ValueKind::number,
       .meaning = "Brooks-Corey: pore-size distribution index.",
       .examples = {"0.4"},
       .range = Range{0.05, 20.0, "0.05 to 20"}},
      {.name = "Ks",
       .kind = ValueKind::quantity,
       .meaning = "Saturated conductivity at 20 degC.",
       .examples = {"1.04 cm/h"},
       .dimension = Dimension::speed,
       .range = conductivity_range()},
  };
  return section;
}

}  // namespace

std::vector<Key> soil_keys() {
  return {
      {.name = "texture",
       .kind = ValueKind::phrase,
       .also_called = {"soil", "class"},
       .meaning = "USDA class of the soil, with a moisture word if wanted: its published averages.",
       .examples = {"silt loam, moist", "sandy loam"}},
      {.name = "published",
       .kind = ValueKind::text,
       .meaning = "Use only this published table of class averages; all tables if not given.",
       .examples = {"Carsel & Parrish 1988"}},
      parameters_grammar(),
      {.name = "capillary length",
       .kind = ValueKind::quantity,
       .meaning = "The soil by its macroscopic capillary length, with fillable porosity and Kfs.",
       .examples = {"8 cm"},
       .dimension = Dimension::head,
       .range = Range{0.002, 5.0, "0.2 cm to 5 m"}},
      {.name = "alpha star",
       .kind = ValueKind::phrase,
       .meaning = "The soil by alpha* = 1 / capillary length: a value or the words of a class, "
                  "with fillable porosity and Kfs.",
       .examples = {"0.12 1/cm", "structured"},
       .dimension = Dimension::per_head,
       .range = Range{0.2, 500.0, "0.002 1/cm to 5 1/cm"}},
      {.name = "fillable porosity",
       .kind = ValueKind::quantity,
       .meaning = "Water content gained from before the test to saturation.",
       .examples = {"25 %"},
       .range = Range{0.005, 0.8, "0.5 % to 80 %"}},
      {.name = "Kfs",
       .kind = ValueKind::phrase,
       .also_called = {"k", "ksat", "conductivity", "ks"},
       .meaning = "Field-saturated conductivity, at 20 degC unless another temperature is named.",
       .examples = {"18 mm/h at 20 degC"},
       .dimension = Dimension::speed,
       .range = conductivity_range()},
      {.name = "moisture",
       .kind = ValueKind::phrase,
       .meaning = "Before the test: dry, moist or wet (suction 3000, 300, 60 cm), a suction, a "
                  "water content, a degree of saturation, or for the whole ground hydrostatic to a "
                  "depth.",
       .examples = {"moist", "suction 300 cm", "content 25 %", "60 % full", "hydrostatic to 2 m"}},
      {.name = "minimum capillary height",
       .kind = ValueKind::quantity,
       .also_called = {"h s", "hs"},
       .meaning = "h_s of van Genuchten curves: saturated above it; -2 cm where n < 2, else 0.",
       .examples = {"-2 cm"},
       .dimension = Dimension::head,
       .range = Range{-0.2, 0.0, "-20 cm to 0 cm"}},
      {.name = "Kr over Kz",
       .kind = ValueKind::number,
       .also_called = {"anisotropy", "kh over kv", "kr/kz"},
       .meaning = "Horizontal over vertical conductivity; 1 if not given.",
       .examples = {"3"},
       .range = Range{0.01, 100.0, "0.01 to 100"}},
  };
}

}  // namespace ringwright::cases
