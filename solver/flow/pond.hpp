#pragma once
/// Water standing on a boundary patch whose level is an unknown of the flow equation.
///
/// The pond is one more cell: its unknown is the head H at the soil surface, its storage the
/// depth of water max(H - base, 0). Below the base nothing stands and H is the suction that the
/// whole patch shares; the storage is then flat, as in a saturated cell, so that drying out and
/// filling are two branches of one equation and nothing has to be smoothed:
///
///   A d(max(H - base, 0))/dt = supply(H) - evaporation - flow into the soil
///
/// supply(H) is the largest rate below the head set and falls to 0 over the last `band` below it.

namespace ringwright::solver {

/// Below the head set, over which a supply is turned down [m]. A head is held to about this.
constexpr double feed_band = 2e-4;

struct Pond {
  int patch = 0;           ///< the boundary patch it stands on
  double area = 0.0;       ///< of the surface that moves with the level [m2], > 0
  double base_head = 0.0;  ///< head at which it is empty [m]
  /// Change of level that counts in the error test like a change of 1 in water content [m].
  double scale = 0.05;
};

/// What is done with it.
struct PondFeed {
  double set_head = 0.0;      ///< no supply above it [m]
  double largest_rate = 0.0;  ///< [m3/s]
  double evaporation = 0.0;   ///< while water stands [m3/s]
};

}  // namespace ringwright::solver
