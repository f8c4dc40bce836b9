#pragma once

namespace ringwright::models {

/// Flow from a disc at head H on a saturated half space, head 0 far away, the surface beside the
/// disc closed, gravity off:  Q = 4 Ks a H.
/// @param Ks [m/s] @param radius a [m] @param head H [m] @return [m3/s]
/// @source Weber 1873, J. reine angew. Math. 75:75 (electrified disc; from memory)
/// @checked tests/models/theory/saturated_disc_test.cpp
double saturated_disc_flow(double Ks, double radius, double head);

}  // namespace ringwright::models
