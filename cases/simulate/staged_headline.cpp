#include "cases/simulate/staged_headline.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/stop_clause.hpp"
#include "cases/simulate/stop_figures.hpp"
#include "cases/simulate/true_kfs_words.hpp"
#include "postprocess/reading/true_kfs.hpp"

namespace ringwright::cases {
namespace {

using postprocess::Answer;
using postprocess::HeadPair;

std::string both_units(double speed) {
  return fmt::format("{} mm/h ({} in/h)", mm_per_hour(speed), inch_per_hour(speed));
}

std::string heads_of(const Answer& answer, const HeadPair& pair) {
  return fmt::format("{} cm, then {} cm", centimetres(answer.stages[pair.first].head_to),
                     centimetres(answer.stages[pair.second].head_to));
}

// Which pair is shown, and why that one.
std::string choice_words(const Answer& answer, const HeadPair& pair) {
  if (answer.pairs.size() == 1) return "";
  if (&pair == &answer.pairs.back()) {
    return " Of the pairs the last is shown: the ground has had the longest to settle.";
  }
  return " The last pair of heads gives no usable Kfs; shown is the last one that does.";
}

std::string as_read_words(const HeadPair& pair) {
  if (!pair.physical_as_read) {
    return " Through this crew's gauge the pair gives no usable Kfs: set the heads further apart "
           "or read finer.";
  }
  if (!differ(pair.kfs.value, pair.kfs_as_read)) return "";
  return fmt::format(
      " Through this crew's gauge, as it happens to be read here, it comes out as "
      "{} mm/h.",
      mm_per_hour(pair.kfs_as_read));
}

std::string pair_sentences(const Case& what, const Answer& answer, const HeadPair& pair) {
  return fmt::format(
      "The form will say Kfs {} by the two-head formula ({}); the true Kfs is {}. That is {} times "
      "the true one.{}{}",
      both_units(pair.kfs.value), heads_of(answer, pair), true_kfs_words(what, answer),
      rounded(pair.reads.value), choice_words(answer, pair), as_read_words(pair));
}

bool has_arrived(const Answer& answer) {
  return std::any_of(answer.pairs.begin(), answer.pairs.end(),
                     [](const HeadPair& pair) { return pair.arrived; });
}

std::string rate_sentences(const Case& what, const Answer& answer) {
  const double rate = rate_at_stop(answer).value;
  std::string text;
  if (!answer.pairs.empty()) {
    text =
        has_arrived(answer)
            ? "The two-head formula gives no usable Kfs from any pair: the flow had not settled, "
              "or "
              "the heads are too close. "
            : "The two-head formula gives no Kfs: at the end of a stage the level had not come to "
              "the head set. ";
  }
  if (!(rate > 0.0)) return text + no_rate_words(what, answer);
  return text + fmt::format(
                    "The form will say {}, the rate of the last reading; the true Kfs is {}. Read "
                    "as Kfs that rate is {} times the true one.",
                    both_units(rate), true_kfs_words(what, answer),
                    rounded(rate / postprocess::true_kfs(answer.question)));
}

std::string other_sentence(const Case& what, const SoilVariant& variant, const Answer& answer) {
  const auto time = stop_time(answer);
  if (!time) return fmt::format(" By {}: ended before the stop.", variant.source);
  const HeadPair* pair = shown_pair(answer);
  const double shown = pair ? pair->kfs.value : rate_at_stop(answer).value;
  return fmt::format(" By {}: {}, {} L, {}{}, true Kfs {}, so {} times.", variant.source,
                     time_text(*time), rounded_up(water_to_bring(answer) * 1e3), pair ? "Kfs " : "",
                     both_units(shown), true_kfs_words(what, answer),
                     rounded(shown / postprocess::true_kfs(answer.question)));
}

std::string comparison(const Case& what, const AnsweredTest& answered) {
  const auto& variants = what.ground.variants;
  std::string text = fmt::format("That is with {}.", variants.front().source);
  for (std::size_t i = 1; i < variants.size(); ++i) {
    text += i < answered.answers.size() ? other_sentence(what, variants[i], answered.answers[i])
                                        : fmt::format(" By {}: not computed.", variants[i].source);
  }
  return text;
}

}  // namespace

std::string staged_headline(const Case& what, const AnsweredTest& answered) {
  const Answer& answer = answered.answers.front();
  const HeadPair* pair = shown_pair(answer);
  std::string text = stop_clause(answer, stop_time(answer).value_or(0.0)) + " " +
                     (pair ? pair_sentences(what, answer, *pair) : rate_sentences(what, answer));
  text = paragraph(text, "  ", "  ");
  if (what.ground.variants.size() > 1)
    text += "\n" + paragraph(comparison(what, answered), "  ", "  ");
  return text;
}

}  // namespace ringwright::cases
