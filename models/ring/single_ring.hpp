#pragma once

namespace ringwright::models {

/// One open ring driven into the ground, its wall taken as impermeable and infinitely thin.
struct SingleRing {
  double radius = 0.0;          ///< inner radius a [m]
  double insertion = 0.0;       ///< depth d of the wall below the soil surface [m]; 0 or >= 0.005
};

}  // namespace ringwright::models
