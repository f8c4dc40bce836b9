#pragma once
/// Classes of alpha* = 1 / capillary length that a crew picks by looking at the soil.

#include <optional>
#include <span>
#include <string_view>

namespace ringwright::cases {

/// One class after Elrick, Reynolds & Tan (1989), Ground Water Monitoring Review 9:184 (values
/// from memory); the sentences are our own.
struct AlphaStarClass {
  std::string_view word;  ///< as in a case file
  double alpha_star;      ///< [1/m]
  std::string_view sentence;
};

/// From long to short capillary length.
std::span<const AlphaStarClass> alpha_star_classes();

}  // namespace ringwright::cases
