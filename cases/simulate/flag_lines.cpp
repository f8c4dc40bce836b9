#include "cases/simulate/flag_lines.hpp"

#include <algorithm>
#include <cctype>
#include <vector>

#include "cases/simulate/flag_words.hpp"
#include "cases/simulate/paragraph.hpp"

namespace ringwright::cases {
namespace {

using postprocess::Answer;
using postprocess::Flag;
using postprocess::FlagKind;

// Those that can hurt, worst first; the rest after them.
constexpr FlagKind hurtful[] = {FlagKind::lid_not_for_use, FlagKind::lid_lift, FlagKind::piping,
                                FlagKind::fracture, FlagKind::insertion_share};

std::ptrdiff_t rank(const Flag& flag) {
  return std::find(std::begin(hurtful), std::end(hurtful), flag.kind) - std::begin(hurtful);
}

bool hurts(const Flag& flag) { return rank(flag) < std::ssize(hurtful); }

bool is_lid(const Flag& flag) {
  return flag.kind == FlagKind::lid_not_for_use || flag.kind == FlagKind::lid_lift;
}

std::string sentence(const Flag& flag, const Answer& answer) {
  std::string words = flag_words(flag, answer);
  words.front() = static_cast<char>(std::toupper(static_cast<unsigned char>(words.front())));
  return words + ".";
}

}  // namespace

std::string not_for_use(const Answer& answer) {
  const bool marked = std::any_of(answer.flags.begin(), answer.flags.end(), [](const Flag& flag) {
    return flag.kind == FlagKind::lid_not_for_use;
  });
  return marked ? paragraph(
                      "*** NOT FOR USE: a lid under pressure without a stated relief and a lid "
                      "rating that holds it. Figures only. ***",
                      "  ", "  ")
                : "";
}

std::string flag_lines(const Answer& answer) {
  std::vector<Flag> flags = answer.flags;
  std::stable_sort(flags.begin(), flags.end(),
                   [](const Flag& a, const Flag& b) { return rank(a) < rank(b); });
  std::string text;
  for (const Flag& flag : flags) text += paragraph(sentence(flag, answer), "  ! ", "    ");
  if (std::any_of(flags.begin(), flags.end(), is_lid)) {
    text += paragraph(
        "Lid, relief, ballast and clamps are designed and checked by a competent "
        "person; local rules for pressure equipment decide.",
        "    ", "    ");
  } else if (std::any_of(flags.begin(), flags.end(), hurts)) {
    text +=
        paragraph("The local code and a competent person decide whether to go on.", "    ", "    ");
  }
  return text;
}

}  // namespace ringwright::cases
