#include "cases/input/step_down.hpp"

namespace ringwright::cases {

std::optional<models::StepDown> read_step_down(const SectionReader& section) {
  const auto word = section.text("step down");
  if (!word) return std::nullopt;
  if (*word == "bail") return models::StepDown::bail;
  return *word == "bleed" ? models::StepDown::bleed : models::StepDown::fall;
}

}  // namespace ringwright::cases
