#include "cases/input/minimum_capillary_height.hpp"

#include <fmt/format.h>

#include <algorithm>

#include "models/soil/catalogue.hpp"

namespace ringwright::cases {
namespace {

constexpr std::string_view key = "minimum capillary height";

}  // namespace

std::optional<double> read_minimum_capillary_height(const SectionReader& ground,
                                                    std::span<const double> n,
                                                    std::string_view n_key, Reading& reading) {
  // Below n = 1.3 and nearer to 0 than a millimetre the conductivity falls to a fraction within
  // so small a suction that no mesh of use resolves it.
  constexpr double least_n = 1.3;
  constexpr double least_height = 0.001;
  const double smallest = *std::min_element(n.begin(), n.end());
  const auto given = ground.quantity(key);
  if (given && smallest<least_n&& * given> - least_height) {
    reading.contradiction(
        ground.value_place(key),
        fmt::format("{}{} is refused for a soil of n = {:.3g}: its conductivity falls so "
                    "steeply at saturation that no mesh resolves it",
                    ground.front_of(key), ground.text(key).value_or(""), smallest),
        ground.key_place(n_key), "n is from here",
        "give -0.1 cm or lower (usual: -2 cm); 0 cm is allowed from n = 1.3");
  }
  if (!ground.has(key)) {
    const double height = models::default_minimum_capillary_height(smallest);
    reading.assume(ground.path_of(key),
                   fmt::format("minimum capillary height {:g} cm", 100 * height));
  }
  return given;
}

void refuse_minimum_capillary_height(const SectionReader& ground, std::string_view curve,
                                     const Place& curve_place, Reading& reading) {
  if (!ground.has(key)) return;
  reading.contradiction(ground.key_place(key),
                        fmt::format("{}only van Genuchten curves have one", ground.front_of(key)),
                        curve_place, fmt::format("this soil has a {} curve", curve),
                        "leave it out");
}

}  // namespace ringwright::cases
