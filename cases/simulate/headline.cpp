#include "cases/simulate/headline.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/staged_headline.hpp"
#include "cases/simulate/stop_clause.hpp"
#include "cases/simulate/stop_figures.hpp"
#include "cases/simulate/true_kfs_words.hpp"

namespace ringwright::cases {
namespace {

using postprocess::Answer;
using postprocess::LadderRow;
using postprocess::ReadsX;

std::string first_sentences(const Case& what, const Answer& answer, const LadderRow& stop) {
  if (!(stop.rate.value > 0.0))
    return stop_clause(answer, stop.time) + " " + no_rate_words(what, answer);
  return fmt::format(
      "{} The form will say {} mm/h ({} in/h); the true Kfs is {}. Read as Kfs that rate is {} "
      "times the true one; by the one-head formula with alpha* {:g} 1/cm, {} times.",
      stop_clause(answer, stop.time), mm_per_hour(stop.rate.value), inch_per_hour(stop.rate.value),
      true_kfs_words(what, answer), rounded(stop.reads.rate_as_kfs.value),
      answer.question.assumed_alpha_star / 100.0, rounded(stop.reads.one_head.value));
}

std::string other_sentence(const Case& what, const SoilVariant& variant, const Answer& answer) {
  const LadderRow* stop = stop_of(answer);
  if (stop == nullptr) return fmt::format(" By {}: ended before the stop.", variant.source);
  const bool missed = has_rule(answer) && !answer.stop_rule_met;
  return fmt::format(" By {}: {} {}, {} L, {} mm/h ({} in/h), true Kfs {}.", variant.source,
                     missed ? "rule not met by" : "stop at", time_text(stop->time),
                     rounded_up(water_to_bring(answer) * 1e3), mm_per_hour(stop->rate.value),
                     inch_per_hour(stop->rate.value), true_kfs_words(what, answer));
}

std::string spread(const AnsweredTest& answered, postprocess::Figure ReadsX::*reading) {
  double least = 0.0, most = 0.0;
  for (const Answer& answer : answered.answers) {
    const LadderRow* stop = stop_of(answer);
    if (stop == nullptr) continue;
    const double value = (stop->reads.*reading).value;
    least = most == 0.0 ? value : std::min(least, value);
    most = std::max(most, value);
  }
  const std::string from = rounded(least), to = rounded(most);
  return from == to ? from : from + " to " + to;
}

// What the other readings of the user's words say, and how far they are apart.
std::string comparison(const Case& what, const AnsweredTest& answered) {
  const auto& variants = what.ground.variants;
  std::string text = fmt::format("That is with {}.", variants.front().source);
  for (std::size_t i = 1; i < answered.answers.size(); ++i) {
    text += other_sentence(what, variants[i], answered.answers[i]);
  }
  for (std::size_t i = answered.answers.size(); i < variants.size(); ++i) {
    text += fmt::format(" By {}: not computed.", variants[i].source);
  }
  const auto known = std::count_if(answered.answers.begin(), answered.answers.end(),
                                   [](const Answer& a) { return stop_of(a) != nullptr; });
  if (known < 2) return text;
  return text +
         fmt::format(" Across the {} published tables the rate reads x {}, the formula x {}.",
                     answered.answers.size() == 2 ? "two" : std::to_string(answered.answers.size()),
                     spread(answered, &ReadsX::rate_as_kfs), spread(answered, &ReadsX::one_head));
}

std::string ended_early(const Answer& answer) {
  const auto& readings = answer.record.readings;
  if (answer.ended_early && readings.empty()) {
    return "The water is used up before the first reading: bring more, or a smaller ring.";
  }
  return fmt::format("Ended before the stop of the test: no figures for it. {}",
                     readings.empty()
                         ? "There is no reading yet."
                         : fmt::format("The record goes to {}.", time_text(readings.back().time)));
}

}  // namespace

std::string headline(const Case& what, const AnsweredTest& answered) {
  const LadderRow* stop = stop_of(answered.answers.front());
  if (stop == nullptr) {
    if (stop_time(answered.answers.front())) return staged_headline(what, answered);
    return paragraph(ended_early(answered.answers.front()), "  ", "  ");
  }
  std::string text = paragraph(first_sentences(what, answered.answers.front(), *stop), "  ", "  ");
  if (what.ground.variants.size() > 1)
    text += "\n" + paragraph(comparison(what, answered), "  ", "  ");
  return text;
}

}  // namespace ringwright::cases
