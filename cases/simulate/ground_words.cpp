#include "cases/simulate/ground_words.hpp"

#include <fmt/format.h>

#include "cases/simulate/paragraph.hpp"
#include "cases/simulate/printed_number.hpp"

namespace ringwright::cases {

std::string ground_below(const Ground& ground) {
  std::string text;
  const auto add = [&](const std::string& part) { text += (text.empty() ? "" : "; ") + part; };
  const auto cm = [](double length) { return centimetres(length) + " cm"; };
  for (const GroundLayer& layer : ground.layers_below)
    add(fmt::format("{} from {} down", layer.name, cm(layer.top)));
  if (ground.water_table) add("water table at " + cm(*ground.water_table));
  if (ground.disturbed)
    add(fmt::format("disturbed {} to either side of the wall, Ks x {:g}",
                    cm(ground.disturbed->width), ground.disturbed->factor));
  if (ground.gap) add(fmt::format("a gap of {:g} mm along the wall", 1e3 * ground.gap->width));
  if (ground.liner) add(fmt::format("liner {} thick", cm(*ground.liner)));
  if (text.empty()) return "";
  return paragraph("Below the level of the test: " + text + ".", "    ", "    ");
}

}  // namespace ringwright::cases
