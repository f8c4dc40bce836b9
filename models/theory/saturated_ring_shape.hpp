#pragma once

namespace ringwright::models {

/// Flow factor F = Q/(Ks a H) of a ring driven d deep into a saturated half space, head 0 far
/// away, the surface outside closed, gravity off:
///
///   pi / F = d/a + 0.6133 + 1 / (8 d/a + 5.81)
///
/// i.e. a filled tube, the end correction 0.6133 a of a pipe without flange, and a term that
/// leads to the disc (F = 4) at d = 0. Fitted for this project to finite-volume solutions, right to
/// 0.14 % for 0 <= d/a <= 5.
/// @param insertion_over_radius d/a [-], >= 0
/// @return [-]
/// @throws std::invalid_argument below 0
/// @source the end correction: Levine & Schwinger 1948, Phys. Rev. 73:383; the fit: derived here
/// @checked tests/models/theory/saturated_ring_shape_test.cpp
double saturated_ring_flow_factor(double insertion_over_radius);

}  // namespace ringwright::models
