#include "cases/input/read_walls.hpp"

namespace ringwright::cases {

void read_walls(const SectionReader& section, Ground& ground) {
  if (section.has("disturbed")) {
    const SectionReader disturbed = section.subsection("disturbed");
    const auto width = disturbed.quantity("width");
    const auto factor = disturbed.quantity("Ks x");
    if (width && factor) ground.disturbed = models::DisturbedSoil{*width, *factor};
  }
  if (const auto gap = section.quantity("wall gap")) ground.gap = models::WallGap{*gap};
}

}  // namespace ringwright::cases
