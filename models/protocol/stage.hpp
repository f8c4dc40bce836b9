#pragma once
/// One stage of a test: a head held, or a free fall from a depth.
///
/// Heads are pressure heads at the soil surface [m]: in an open ring the depth of the water, under
/// a lid the ponding depth plus the pressure.

#include <optional>

namespace ringwright::models {

enum class StageKind { constant_head, free_fall };

/// How the level comes down to a lower head.
enum class StepDown {
  fall,  ///< nothing is added until the soil has drunk it down; the default in an open ring
  bail,  ///< water is taken out of the ring
  bleed  ///< water is let out from under a lid
};

struct Stage {
  StageKind kind = StageKind::constant_head;
  double head = 0.0;               ///< head held, or head the fall starts from [m], >= 0
  double duration = 0.0;           ///< [s], > 0
  double ramp = 5.0;               ///< time the change from the head before takes [s], >= 0
  StepDown down = StepDown::fall;  ///< used when the stage before ends above `head`
  std::optional<double> refill_below = std::nullopt;  ///< free fall: filled up to `head` again when
                                                      ///< the head has sunk to this [m]
  bool soak = false;  ///< wets the ground before the test proper: runs, but is not read
};

}  // namespace ringwright::models
