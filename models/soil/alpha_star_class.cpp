#include "models/soil/alpha_star_class.hpp"

#include <algorithm>
#include <array>
#include <cmath>
#include <stdexcept>

namespace ringwright::models {
namespace {

constexpr std::array<AlphaStarClass, 4> kClasses{{
    {"compacted", 1.0, "capillary length 100 cm: clay or silt packed until no structure is left"},
    {"fine", 4.0, "capillary length 25 cm: clayey or silty soil without structure"},
    {"structured", 12.0, "capillary length 8.3 cm: clay to loam with structure, finer sands"},
    {"coarse", 36.0, "capillary length 2.8 cm: coarse sand, gravel, wide cracks or large pores"},
}};

}  // namespace

std::span<const AlphaStarClass> alpha_star_classes() { return kClasses; }

const AlphaStarClass& usual_alpha_star_class() { return kClasses[2]; }

const AlphaStarClass& nearest_alpha_star_class(double alpha_star) {
  if (!(alpha_star > 0.0)) throw std::invalid_argument("alpha* must be above 0");
  const auto distance = [alpha_star](const AlphaStarClass& candidate) {
    return std::abs(std::log(candidate.alpha_star / alpha_star));
  };
  return *std::min_element(
      kClasses.begin(), kClasses.end(),
      [&](const auto& left, const auto& right) { return distance(left) < distance(right); });
}

}  // namespace ringwright::models
