#pragma once

namespace ringwright::models {

/// One open ring. Driven in, its wall is taken as impermeable and infinitely thin; set on the
/// surface (insertion 0) the wall covers a strip of its own thickness: without that strip the
/// flow from the pond to the open surface beside it would be infinite for any head above 0.
struct SingleRing {
  double radius = 0.0;     ///< inner radius a [m]
  double insertion = 0.0;  ///< depth d of the wall below the soil surface [m]; 0 or >= 0.005
  double wall = 0.003;     ///< thickness of the wall [m]
};

}  // namespace ringwright::models
