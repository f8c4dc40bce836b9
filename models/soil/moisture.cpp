#include "models/soil/moisture.hpp"

#include <array>
#include <stdexcept>

namespace ringwright::models {
namespace {

constexpr std::array<MoistureWord, 3> kWords{{{"dry", 30.0}, {"moist", 3.0}, {"wet", 0.6}}};

MoistureState state(const Soil& soil, double h, double Se) {
  const double theta = soil.theta_r + (soil.theta_s - soil.theta_r) * Se;
  return {h, 0.0 - h, theta, theta / soil.theta_s, Se};
}

}  // namespace

std::span<const MoistureWord> moisture_words() { return kWords; }

std::optional<double> suction_of_word(std::string_view word) {
  for (const MoistureWord& candidate : kWords) {
    if (candidate.word == word) return candidate.suction;
  }
  return std::nullopt;
}

MoistureState moisture_at_suction(const Soil& soil, double suction) {
  if (!(suction >= 0.0)) throw std::invalid_argument("a suction must not be below 0");
  const double h = 0.0 - suction;
  return state(soil, h, soil.curves->saturation(h));
}

MoistureState moisture_at_content(const Soil& soil, double theta) {
  if (!(theta > soil.theta_r && theta <= soil.theta_s)) {
    throw std::invalid_argument("a water content must lie above theta_r and not above theta_s");
  }
  const double Se = (theta - soil.theta_r) / (soil.theta_s - soil.theta_r);
  return state(soil, soil.curves->head_at(Se), Se);
}

MoistureState moisture_at_saturation(const Soil& soil, double degree) {
  // theta_s exactly at 1: the product rounds
  return moisture_at_content(soil, degree == 1.0 ? soil.theta_s : degree * soil.theta_s);
}

}  // namespace ringwright::models
