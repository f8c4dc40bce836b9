#include "cases/simulate/test_title.hpp"

#include <fmt/format.h>

#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"
#include "cases/simulate/version.hpp"

namespace ringwright::cases {
namespace {

using models::Stage;
using models::StageKind;

constexpr std::size_t most_heads = 6;  // that a title names one by one

std::string ring_words(const Test& test) {
  const std::string inner = centimetres(2.0 * test.ring.radius);
  const std::string driven = centimetres(test.ring.insertion);
  if (!test.outer_ring) {
    return fmt::format("{} cm ring{}, {} cm into", inner, test.lid ? " under a lid" : "", driven);
  }
  const std::string outer_driven = centimetres(test.outer_ring->insertion);
  return fmt::format("{} and {} cm double ring{}, {} cm into", inner,
                     centimetres(2.0 * test.outer_ring->radius),
                     test.sealed_volume ? ", the inner one sealed" : "",
                     driven == outer_driven ? driven : driven + " and " + outer_driven);
}

std::string fall_words(const Stage& stage) {
  std::string text = "falling head from " + centimetres(stage.head) + " cm";
  if (stage.refill_below) {
    text += fmt::format(", filled up again at {} cm", centimetres(*stage.refill_below));
  }
  return text;
}

// Heads of the stages that are read.
std::string heads_words(const std::vector<Stage>& stages) {
  std::string text;
  std::size_t count = 0;
  for (const Stage& stage : stages) {
    if (stage.soak) continue;
    if (stage.kind == StageKind::free_fall) return fall_words(stage);
    if (++count > most_heads) continue;
    text += (count > 1 ? ", " : "") + centimetres(stage.head);
  }
  if (count == 1) return text + " cm constant head";
  if (count > most_heads) text += fmt::format(" and {} more", count - most_heads);
  return fmt::format("heads {} cm", text);
}

std::string program_words(const Test& test) {
  const auto& stages = test.program.stages;
  std::string text;
  if (!stages.empty() && stages.front().soak) {
    text = fmt::format("soaked at {} cm, then ", centimetres(stages.front().head));
  }
  text +=
      stages.empty() ? centimetres(test.protocol.head) + " cm constant head" : heads_words(stages);
  if (!test.outer.stages.empty() && test.outer.stages.front().head != test.protocol.head) {
    text += fmt::format(" (outer ring {} cm)", centimetres(test.outer.stages.front().head));
  }
  return text;
}

}  // namespace

std::string test_title(const Case& what, const Test& test) {
  std::string text = fmt::format("Ringwright {}: one virtual ring test", program_version);
  if (!what.job.empty()) text += fmt::format(" for {}", what.job);
  return paragraph(text, "", "  ") +
         paragraph(fmt::format("{}: {} {} ({}), {}, water {:g} degC", test.name, ring_words(test),
                               what.ground.variants.front().label, what.ground.moisture.words,
                               program_words(test), what.ground.water_temperature),
                   "", "  ");
}

}  // namespace ringwright::cases
