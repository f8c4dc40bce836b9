#include "cases/command/check_ground.hpp"

#include <fmt/format.h>

#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/question.hpp"
#include "models/soil/durner.hpp"
#include "models/soil/van_genuchten.hpp"
#include "models/water/viscosity.hpp"

namespace ringwright::cases {
namespace {

// In the units a user gives them in; other families describe themselves.
std::string curve_words(const models::Curves& curves) {
  const auto* van_genuchten = dynamic_cast<const models::VanGenuchten*>(&curves);
  if (van_genuchten == nullptr) return curves.describe();
  return fmt::format(
      "van Genuchten alpha {:.4g} 1/cm, n {:.4g}, l {:g}, minimum capillary height "
      "{:g} cm",
      van_genuchten->alpha() / 100.0, van_genuchten->n(), van_genuchten->l(),
      100.0 * van_genuchten->entry_head());
}

std::string soil_words(const SoilVariant& variant, double head, double temperature) {
  const double content = variant.soil.water_content(head);
  return fmt::format(
      "{} by {}: Kfs {} mm/h ({} in/h) at 20 degC, {} mm/h at {:g} degC; suction {} cm, {:.0f} % "
      "water, {:.0f} % full; theta_r {:.3g}, theta_s {:.3g}; {}{}",
      variant.label, variant.source, mm_per_hour(variant.soil.Ks), inch_per_hour(variant.soil.Ks),
      mm_per_hour(variant.soil.Ks / models::viscosity_ratio(temperature)), temperature,
      rounded(-100.0 * head), 100.0 * content, 100.0 * content / variant.soil.theta_s,
      variant.soil.theta_r, variant.soil.theta_s, curve_words(*variant.soil.curves),
      variant.soil.anisotropy == 1.0 ? ""
                                     : fmt::format("; Kr over Kz {:g}", variant.soil.anisotropy));
}

std::string depth(double metres) { return centimetres(metres) + " cm"; }

// One reading of the soils: from the level of the test down.
std::string layers(const Case& what, const SoilVariant& variant) {
  const Ground& ground = what.ground;
  const auto setup = question_of(what.tests.front(), ground, variant, what.accuracy, 1).setup;
  const std::string first = ground.layers_below.empty() ? "" : "from the test level: ";
  std::string text = paragraph(
      first + soil_words(variant, setup.initial_head, ground.water_temperature), "  ", "    ");
  for (std::size_t i = 0; i < setup.layers_below.size(); ++i) {
    const models::Layer& layer = setup.layers_below[i];
    SoilVariant below{layer.name, variant.source, layer.soil};
    for (const SoilVariant& candidate : ground.layers_below[i].variants) {
      if (candidate.soil.curves == layer.soil.curves) below = candidate;
    }
    text += paragraph(fmt::format("from {} below it: {}", depth(layer.top),
                                  soil_words(below, layer.initial_head, ground.water_temperature)),
                      "    ", "      ");
  }
  return text;
}

std::string rest(const Ground& ground) {
  std::string text;
  const auto add = [&](const std::string& line) { text += paragraph(line, "  ", "    "); };
  if (ground.test_level > 0)
    add(fmt::format("the test stands {} below ground", depth(ground.test_level)));
  if (ground.water_table)
    add(fmt::format("water table {} below the test, the ground hydrostatic to it",
                    depth(*ground.water_table)));
  else if (ground.moisture.hydrostatic_to)
    add(fmt::format("before the test hydrostatic to {} below it",
                    depth(*ground.moisture.hydrostatic_to)));
  if (ground.disturbed)
    add(fmt::format("disturbed {} to either side of the walls: Ks x {:g}",
                    depth(ground.disturbed->width), ground.disturbed->factor));
  if (ground.gap) add(fmt::format("a gap of {:g} mm along the walls", 1e3 * ground.gap->width));
  if (ground.liner) add(fmt::format("liner {} thick", depth(*ground.liner)));
  if (ground.wet_density)
    add(fmt::format("ground of {:.4g} kg/m3 with its water", *ground.wet_density));
  if (!ground.truth_layer.empty()) add(fmt::format("true Kfs is that of {}", ground.truth_layer));
  return text;
}

}  // namespace

std::string ground_words(const Case& what) {
  std::string text;
  for (const SoilVariant& variant : what.ground.variants) text += layers(what, variant);
  return text + rest(what.ground);
}

}  // namespace ringwright::cases
