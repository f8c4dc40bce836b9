#include "cases/input/read_capillary_soil.hpp"

#include <fmt/format.h>

#include <stdexcept>

#include "cases/input/minimum_capillary_height.hpp"
#include "cases/input/read_phrases.hpp"
#include "models/soil/soil_from_capillary_length.hpp"

namespace ringwright::cases {
namespace {

void check_needed(const SectionReader& ground, const std::string& key, Reading& reading) {
  for (const std::string_view needed : {"fillable porosity", "Kfs"}) {
    if (ground.has(needed)) continue;
    reading.problem(ground.key_place(key),
                    fmt::format("{}'{}' is needed beside it", ground.front_of(key), needed),
                    needed == "Kfs" ? "for example  Kfs: 18 mm/h at 20 degC"
                                    : "for example  fillable porosity: 25 %");
  }
}

std::optional<double> read_alpha(const SectionReader& ground, const std::string& key) {
  if (key == "alpha star") return read_alpha_star(ground, key);
  const auto length = ground.quantity(key);
  if (!length) return std::nullopt;
  return 1.0 / *length;
}

}  // namespace

std::vector<SoilVariant> read_capillary_soil(const SectionReader& ground, const std::string& key,
                                             std::optional<double> suction, Reading& reading) {
  check_needed(ground, key, reading);
  refuse_minimum_capillary_height(ground, "Gardner", ground.key_place(key), reading);
  const auto alpha = read_alpha(ground, key);
  const auto porosity = ground.quantity("fillable porosity");
  const auto Kfs = read_conductivity(ground, "Kfs", reading);
  if (ground.has("moisture") && !suction) {
    reading.contradiction(
        ground.value_place("moisture"),
        ground.front_of("moisture") + "this soil is known by its fillable porosity only",
        ground.key_place(key), "the soil is given here",
        "say the moisture as dry, moist, wet or a suction");
  }
  if (!alpha || !porosity || !Kfs || !suction) return {};
  try {
    return {{fmt::format("soil of capillary length {:.3g} cm", 100 / *alpha), "case file",
             models::soil_from_capillary_length(1 / *alpha, *porosity, *Kfs, -*suction)}};
  } catch (const std::invalid_argument&) {
    reading.contradiction(
        ground.value_place("fillable porosity"),
        fmt::format("{}more than such a soil can take up from a suction of {:.4g} cm",
                    ground.front_of("fillable porosity"), 100 * *suction),
        ground.key_place(key), "the capillary length is given here",
        "give a smaller fillable porosity, or a drier start");
    return {};
  }
}

}  // namespace ringwright::cases
