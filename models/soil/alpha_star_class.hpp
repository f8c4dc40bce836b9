#pragma once
/// The four classes of alpha* = 1 / capillary length that a crew picks by looking at the soil.

#include <span>
#include <string_view>

namespace ringwright::models {

struct AlphaStarClass {
  std::string_view word;      ///< short name: "structured"
  double alpha_star;          ///< [1/m]
  std::string_view sentence;  ///< capillary length first, then the soils it is meant for
};

/// From long to short capillary length: 0.01, 0.04, 0.12, 0.36 per cm.
/// @source Elrick, Reynolds & Tan 1989, Ground Water Monit. Rev. 9:184; Elrick & Reynolds 1992,
///   Soil Sci. Soc. Am. J. 56:320 (values and references from memory); sentences our own
std::span<const AlphaStarClass> alpha_star_classes();

/// The class assumed where nothing else is said: 0.12 per cm.
const AlphaStarClass& usual_alpha_star_class();

/// The class whose alpha* is nearest on a logarithmic scale. @param alpha_star [1/m], > 0
/// @throws std::invalid_argument otherwise
const AlphaStarClass& nearest_alpha_star_class(double alpha_star);

}  // namespace ringwright::models
