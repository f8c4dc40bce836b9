#pragma once
/// The lid of a closed ring: what its maker and the crew know of it.

#include <optional>

namespace ringwright::models {

/// Pressures are heads above the soil surface [m], as in a stage.
struct Lid {
  std::optional<double> seal_radius;  ///< out to which the water presses on the lid [m]; none: the
                                      ///< ring's inner radius, which is too little for most seals
  std::optional<double> relief_head;  ///< highest head the supply can reach under the lid [m]:
                                      ///< overflow, relief valve, or pump with its valve open
  std::optional<double> rating;       ///< highest head the lid is made for [m]
  double weight = 0.0;                ///< mass of lid and ring that resists lifting [kg]
  double underside = 0.0;  ///< height of the lid's underside above the soil surface [m]; the head
                           ///< that presses on the lid is less by it
  bool by_air = false;     ///< pressed by air instead of a water standpipe
};

/// Whether relief and rating are both stated and the rating holds the relief: without that a test
/// is simulated but not for use. A competent person designs and checks the lid all the same.
inline bool is_stated_safe(const Lid& lid) {
  return lid.relief_head && lid.rating && *lid.rating >= *lid.relief_head;
}

}  // namespace ringwright::models
