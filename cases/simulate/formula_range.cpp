#include "cases/simulate/formula_range.hpp"

#include <fmt/format.h>

#include <cmath>

#include "cases/simulate/paragraph.hpp"
#include "models/estimators/reynolds_elrick_single_head.hpp"

namespace ringwright::cases {
namespace {

// SI of a limit as people write it.
struct Unit {
  double factor;
  const char* text;
};

Unit unit_of(std::string_view si) {
  if (si == "m") return {100.0, " cm"};
  if (si == "1/m") return {0.01, " 1/cm"};
  return {1.0, ""};
}

std::string range(const models::PublishedLimit& limit, const Unit& unit) {
  const double low = limit.lowest * unit.factor, high = limit.highest * unit.factor;
  if (std::isinf(high)) return fmt::format("from {:.3g}{} up", low, unit.text);
  if (std::isinf(low)) return fmt::format("up to {:.3g}{}", high, unit.text);
  return fmt::format("for {:.3g} to {:.3g}{}", low, high, unit.text);
}

}  // namespace

std::string formula_range(const postprocess::Answer& answer) {
  const auto& q = answer.question;
  const models::SteadyRing test{.rate = 0.0,
                                .head = q.setup.pond_head,
                                .radius = q.setup.ring.radius,
                                .insertion = q.setup.ring.insertion};
  std::string list;
  for (const models::LimitBroken& broken :
       models::reynolds_elrick_limits_broken(test, q.assumed_alpha_star)) {
    const Unit unit = unit_of(broken.limit.unit);
    list += fmt::format("{}{} {:.3g}{}, stated {}", list.empty() ? "" : "; ", broken.limit.quantity,
                        broken.value * unit.factor, unit.text, range(broken.limit, unit));
  }
  if (list.empty()) return "";
  return paragraph(
      "Formula outside its published range (from memory, check the paper): " + list + ".", "  ",
      "    ");
}

}  // namespace ringwright::cases
