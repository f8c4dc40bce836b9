#include "cases/simulate/screen_foot.hpp"

#include <fmt/format.h>

#include <algorithm>
#include <set>
#include <string>

#include "cases/simulate/ground_words.hpp"
#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/stop_figures.hpp"
#include "models/soil/van_genuchten.hpp"

namespace ringwright::cases {
namespace {

using postprocess::Answer;

std::string steady_sentence(const Answer& answer) {
  // Only a head that is constant from start to end has one steady flow.
  if (answer.interrupted || answer.ladder.empty()) return "";
  const std::string time = about_time(answer.time_to_steady.time);
  return answer.time_to_steady.beyond
             ? fmt::format(" Not within 5 % of steady even after {}.", time)
             : fmt::format(" Within 5 % of steady after {}.", time);
}

// " with minimum capillary height -2 cm", which fixes much of the capillary length of fine soils.
std::string height_words(const models::Soil& soil) {
  const auto* curves = dynamic_cast<const models::VanGenuchten*>(soil.curves.get());
  if (curves == nullptr) return "";
  return fmt::format(" with minimum capillary height {:g} cm", 100.0 * curves->entry_head());
}

// "silt loam by Carsel & Parrish 1988: suction 300 cm, 24 % water, 53 % full; capillary length
// 11 cm with minimum capillary height -2 cm"
std::string ground_as_run(const SoilVariant& variant, const Answer& answer) {
  const models::Soil& soil = answer.question.setup.soil;
  const double head = answer.question.setup.initial_head;
  const double content = soil.water_content(head);
  // A soil known by its fillable porosity alone has no water content worth telling.
  const std::string moisture =
      content < 0.005 * soil.theta_s
          ? fmt::format("{:.0f} % still to fill", 100.0 * (soil.theta_s - content))
          : fmt::format("{:.0f} % water, {:.0f} % full", 100.0 * content,
                        100.0 * content / soil.theta_s);
  std::string text = fmt::format("{} by {}: suction {} cm, {}", variant.label, variant.source,
                                 rounded(-100.0 * head), moisture);
  if (!(answer.own_capillary_length > 0.0)) return text;
  return text + fmt::format("; capillary length {}{}", about_cm(answer.own_capillary_length),
                            height_words(soil));
}

double worst_error(const AnsweredTest& answered) {
  double worst = 0.0;
  for (const Answer& answer : answered.answers) {
    worst = std::max(worst, answer.worst_relative_error);
  }
  return worst;
}

double worst_balance(const AnsweredTest& answered) {
  double worst = 0.0;
  for (const Answer& answer : answered.answers) worst = std::max(worst, answer.balance_error);
  return worst;
}

// By what factor the rates at the stop differ between the readings of the soil; 1 for one alone.
double rate_ratio(const AnsweredTest& answered) {
  double least = 0.0, most = 0.0;
  for (const Answer& answer : answered.answers) {
    const double rate = rate_at_stop(answer).value;
    if (!(rate > 0.0)) continue;
    least = most == 0.0 ? rate : std::min(least, rate);
    most = std::max(most, rate);
  }
  return least > 0.0 ? most / least : 1.0;
}

// The wetted depth is not among the figures promised to the accuracy asked for.
std::string wetted_error_words(const Answer& answer) {
  if (!(answer.wetted_depth.error > 0.0)) return "";
  return fmt::format(" (wetted: {} down, {} beside)", about_cm(answer.wetted_depth.error),
                     about_cm(answer.wetted_beyond_wall.error));
}

std::string numerical_words(const Case& what, const AnsweredTest& answered) {
  const bool met = std::all_of(answered.answers.begin(), answered.answers.end(),
                               [](const Answer& answer) { return answer.accuracy_met; });
  if (answered.answers.back().interrupted && !stop_time(answered.answers.back())) {
    return "the numerical error of an interrupted run is not known.";
  }
  const std::string balance = fmt::format("water balance {:.0e}", worst_balance(answered));
  const std::string error =
      percent(worst_error(answered)) + wetted_error_words(answered.answers.front());
  if (met) return fmt::format("numerical error at most {}, {}.", error, balance);
  return fmt::format("the accuracy asked for, {}, is NOT MET: numerical error {}, {}.",
                     given_percent(what.accuracy), error, balance);
}

bool of_another_test(const Assumption& assumption, const Test& test) {
  return assumption.key.starts_with("tests.") &&
         !assumption.key.starts_with("tests." + test.name + ".");
}

// How many readings of the soil have figures at their stop.
std::size_t known(const AnsweredTest& answered) {
  return static_cast<std::size_t>(
      std::count_if(answered.answers.begin(), answered.answers.end(),
                    [](const Answer& answer) { return stop_time(answer).has_value(); }));
}

}  // namespace

std::string stop_details(const Answer& answer) {
  const auto stop = stop_time(answer);
  if (!stop) return "";
  const double area = answer.record.ring_area;
  return paragraph(
             fmt::format("Wetted at {}: {} deep, {} outside the wall. Nothing below that has been "
                         "tested.{}",
                         time_text(*stop), about_cm(answer.wetted_depth.value),
                         about_cm(answer.wetted_beyond_wall.value), steady_sentence(answer)),
             "  ", "    ") +
         paragraph(fmt::format("Supply: {} L to fill the ring while the soil draws up to {}; at "
                               "the stop {}.",
                               litres(answer.filling_volume), flow(answer.peak_flow),
                               flow(rate_at_stop(answer).value * area)),
                   "  ", "    ");
}

std::string assumed_block(const Case& what, const AnsweredTest& answered) {
  std::string text;
  for (std::size_t i = 0; i < answered.answers.size(); ++i) {
    text += paragraph(ground_as_run(what.ground.variants[i], answered.answers[i]) + ".",
                      i == 0 ? "  Ground: " : "    ", "    ");
  }
  text += ground_below(what.ground);
  if (what.assumed.empty()) return text;
  std::string list;
  std::set<std::string> told;  // layers assume the same things
  for (const Assumption& assumption : what.assumed) {
    if (of_another_test(assumption, answered.test) || !told.insert(assumption.text).second)
      continue;
    if (!list.empty()) list += "; ";
    list += assumption.text;
  }
  return text + paragraph("Assumed, change if wrong: " + list + ".", "  ", "    ");
}

std::string doubt_lines(const Case& what, const AnsweredTest& answered) {
  std::string soil = "Doubt about soil and site, not in these figures, far exceeds the arithmetic";
  if (known(answered) > 1) {
    soil = fmt::format(
        "Doubt about soil and site far exceeds the arithmetic: the tables alone differ x {} in the "
        "rate",
        rounded(rate_ratio(answered)));
  }
  return paragraph(fmt::format("{}; {}", soil, numerical_words(what, answered)), "  ", "    ") +
         paragraph(
             "Prediction, not a measurement. Cracks, roots, swelling, clogging and leaks "
             "along the wall are not in it. The local code and the licensed professional "
             "decide.",
             "  ", "    ");
}

}  // namespace ringwright::cases
