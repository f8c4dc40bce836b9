#pragma once
/// Everything that is done with the water in one ring during a test.

#include <optional>
#include <vector>

#include "models/protocol/stage.hpp"
#include "models/protocol/supply.hpp"

namespace ringwright::models {

/// Where the level that belongs to the head moves. An open ring: the ring itself. A lidded ring
/// with a water standpipe: the standpipe, above a ring that stays full.
struct Vessel {
  double area = 0.0;          ///< of the free water surface [m2]; 0: pressed by air, no level moves
  double base_head = 0.0;     ///< head at which it is empty [m]
  double still_volume = 0.0;  ///< water that stands below it and does not move [m3]

  /// Water standing in ring and vessel at a head [m3].
  double volume(double head) const {
    return head > base_head ? still_volume + area * (head - base_head) : still_volume;
  }
};

/// A time without water in the ring: tipped out, leaked away, forgotten.
struct EmptySpell {
  double from = 0.0, to = 0.0;  ///< [s]
};

struct PondProgram {
  std::vector<Stage> stages;  ///< one after the other; the last holds to the end of the test
  Supply supply;
  std::optional<Vessel> vessel = std::nullopt;  ///< none: the open ring itself
  double evaporation = 0.0;  ///< from an open water surface [m/s]
  std::vector<EmptySpell> empty;
};

}  // namespace ringwright::models
