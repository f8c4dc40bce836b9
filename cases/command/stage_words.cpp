#include "cases/command/stage_words.hpp"

#include <fmt/format.h>

#include "cases/simulate/printed_number.hpp"

namespace ringwright::cases {
namespace {

using models::Stage;
using models::StageKind;

std::string down_words(models::StepDown down) {
  switch (down) {
    case models::StepDown::bail:
      return ", bailed down";
    case models::StepDown::bleed:
      return ", bled down";
    case models::StepDown::fall:
      break;
  }
  return ", once the level has fallen to it";
}

std::string one_stage(const Stage& stage, const Stage* before, double from) {
  std::string text = fmt::format("{} to {}: ", from > 0 ? time_text(from) : "start",
                                 time_text(from + stage.duration));
  const std::string head = centimetres(stage.head) + " cm";
  if (stage.kind == StageKind::free_fall) {
    text += "falls from " + head;
    if (stage.refill_below)
      text += fmt::format(", filled up again at {} cm", centimetres(*stage.refill_below));
  } else {
    text += (stage.soak ? "soak at " : "head ") + head;
  }
  if (before && stage.head < before->head - 1e-9) text += down_words(stage.down);
  return text + (stage.soak ? ", not read" : "");
}

}  // namespace

std::vector<std::string> stage_words(const RingProgram& program) {
  std::vector<std::string> lines;
  const auto& stages = program.stages;
  const bool one = stages.size() == 1 && stages[0].kind == StageKind::constant_head;
  if (one) return lines;
  double from = 0.0;
  for (std::size_t i = 0; i < stages.size(); ++i) {
    lines.push_back(one_stage(stages[i], i > 0 ? &stages[i - 1] : nullptr, from));
    from += stages[i].duration;
  }
  return lines;
}

std::vector<std::string> incident_words(const Test& test) {
  std::vector<std::string> lines;
  const auto add = [&](const RingProgram& program, std::string_view ring) {
    for (const models::EmptySpell& spell : program.empty)
      lines.push_back(
          fmt::format("{} empty from {} to {}", ring, time_text(spell.from), time_text(spell.to)));
  };
  add(test.program, test.outer_ring ? "inner ring" : "ring");
  add(test.outer, "outer ring");
  return lines;
}

std::string supply_words(const models::Supply& supply) {
  std::string text;
  if (supply.largest_rate) text = "supply at most " + flow(*supply.largest_rate);
  if (!supply.reservoir) return text;
  text += fmt::format("{}reservoir {} L; when it is empty ", text.empty() ? "" : ", ",
                      litres(*supply.reservoir));
  switch (supply.when_empty) {
    case models::WhenEmpty::go_on:
      return text + "the test goes on without";
    case models::WhenEmpty::stop:
      return text + "the test ends";
    case models::WhenEmpty::refill:
      break;
  }
  return text + "the next is there in " + time_text(supply.refill_time);
}

}  // namespace ringwright::cases
