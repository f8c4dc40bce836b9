#include "cases/command/check_text.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <cmath>

#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/question.hpp"
#include "models/soil/van_genuchten.hpp"

namespace ringwright::cases {
namespace {

std::string in_cm_and_inch(double length) {
  return fmt::format("{} cm ({:.3g} in)", centimetres(length), length / 0.0254);
}

std::string plural(std::size_t count, std::string_view one, std::string_view many) {
  return fmt::format("{} {}", count, count == 1 ? one : many);
}

std::string stop_words(const models::ConstantHead& protocol) {
  const std::string longest = time_text(protocol.longest);
  if (!protocol.stop) return "stops after " + longest;
  return fmt::format("stops when {} readings are within {} of their mean, or after {}",
                     protocol.stop->readings, given_percent(protocol.stop->within), longest);
}

std::string test_words(const Test& test) {
  return fmt::format(
      "{}: ring {} wide, {} into the ground, head {}; {}; read every {}; the crew assumes "
      "alpha* {:g} 1/cm",
      test.name, in_cm_and_inch(2.0 * test.ring.radius), in_cm_and_inch(test.ring.insertion),
      in_cm_and_inch(test.protocol.head), stop_words(test.protocol),
      time_text(
          test.protocol.reading_interval.value_or(std::max(60.0, 0.05 * test.protocol.longest))),
      test.assumed_alpha_star / 100.0);
}

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

std::string soil_words(const Case& what, const SoilVariant& variant) {
  const Ground& ground = what.ground;
  const auto question = question_of(what.tests.front(), ground, variant, what.accuracy, 1);
  const double head = question.setup.initial_head;
  const double content = variant.soil.water_content(head);
  return fmt::format(
      "{} by {}: Kfs {} mm/h ({} in/h) at 20 degC, {} mm/h at {:g} degC; suction {} cm, {:.0f} % "
      "water, {:.0f} % full; theta_r {:.3g}, theta_s {:.3g}; {}",
      variant.label, variant.source, mm_per_hour(variant.soil.Ks), inch_per_hour(variant.soil.Ks),
      mm_per_hour(question.setup.soil.Ks), ground.water_temperature, rounded(-100.0 * head),
      100.0 * content, 100.0 * content / variant.soil.theta_s, variant.soil.theta_r,
      variant.soil.theta_s, curve_words(*variant.soil.curves));
}

std::string assumed_lines(const Case& what) {
  if (what.assumed.empty()) return "Nothing is assumed: everything was given.\n";
  std::size_t longest = 0;
  for (const Assumption& assumption : what.assumed) {
    longest = std::max(longest, assumption.key.size());
  }
  std::string text = "Assumed, change if wrong (left: where to give it):\n";
  for (const Assumption& assumption : what.assumed) {
    text += paragraph(assumption.text, fmt::format("  {:{}}  ", assumption.key, longest),
                      std::string(longest + 4, ' '));
  }
  return text;
}

}  // namespace

double rough_duration(const Case& what) {
  // Measured on one core of a common machine; a finer answer has more cells and more steps.
  constexpr double seconds_at_one_per_cent = 0.2;
  const double runs = static_cast<double>(what.tests.size() * what.ground.variants.size());
  return runs * seconds_at_one_per_cent * std::pow(0.01 / what.accuracy, 1.2);
}

std::string check_text(const Case& what) {
  const std::size_t tests = what.tests.size(), soils = what.ground.variants.size();
  std::string text = what.file.empty() ? "The case is valid" : what.file.string() + " is valid";
  text += fmt::format(": {} on {}, {}.\n", plural(tests, "test", "tests"),
                      plural(soils, "reading of the soil", "readings of the soil"),
                      plural(tests * soils, "virtual test", "virtual tests"));
  if (!what.job.empty()) text += fmt::format("Job: {}\n", what.job);
  text += "\nTests\n";
  for (const Test& test : what.tests) text += paragraph(test_words(test), "  ", "    ");
  text += "\nGround\n";
  for (const SoilVariant& variant : what.ground.variants) {
    text += paragraph(soil_words(what, variant), "  ", "    ");
  }
  text += "\n" + assumed_lines(what);
  const double duration = rough_duration(what);
  const std::string time = duration < 1.0 ? "less than a second" : "about " + about_time(duration);
  return text + "\n" +
         paragraph(fmt::format("Accuracy asked for: {}. Computing takes roughly: {}; several times "
                               "that where a sharp front creeps, in fine dry soil under a wide "
                               "ring.",
                               given_percent(what.accuracy), time),
                   "", "  ");
}

}  // namespace ringwright::cases
