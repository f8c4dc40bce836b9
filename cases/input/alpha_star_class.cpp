#include "cases/input/alpha_star_class.hpp"

#include <array>

namespace ringwright::cases {

std::span<const AlphaStarClass> alpha_star_classes() {
  static constexpr std::array<AlphaStarClass, 4> classes{{
      {"compacted", 1.0, "capillary length 100 cm: clay or silt packed until no structure is left"},
      {"fine", 4.0, "capillary length 25 cm: clayey or silty soil without structure"},
      {"structured", 12.0, "capillary length 8.3 cm: clay to loam with structure, finer sands"},
      {"coarse", 36.0, "capillary length 2.8 cm: coarse sand, gravel, wide cracks or large pores"},
  }};
  return classes;
}

}  // namespace ringwright::cases
