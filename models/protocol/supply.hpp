#pragma once
/// What brings the water.

#include <optional>

namespace ringwright::models {

/// What the crew does when the reservoir is empty.
enum class WhenEmpty {
  go_on,   ///< the water in the ring sinks, and the test goes on without
  stop,    ///< the test ends
  refill,  ///< another reservoir of the same volume is brought
};

/// None given: as much as the soil drinks, at any rate.
struct Supply {
  std::optional<double> largest_rate = std::nullopt;  ///< [m3/s]
  std::optional<double> reservoir = std::nullopt;     ///< usable volume of one filling [m3]
  WhenEmpty when_empty = WhenEmpty::go_on;
  double refill_time = 0.0;  ///< without supply until the next reservoir is there [s]

  bool is_limited() const { return largest_rate || reservoir; }
};

}  // namespace ringwright::models
