#pragma once
/// Flow through a face between two materials.
///
/// The flux potential of the two sides is not comparable, since each soil has its own; what is
/// common is the pressure head at the face. The face head h is found from the flow being the same
/// on both sides,
///
///   q_a = c_a [ Phi_a - Phi_A(h) + K_a r_a + K_A(h) r_a' ],
///   q_b = c_b [ Phi_B(h) - Phi_b + K_B(h) r_b + K_b r_b' ],     q_a = q_b,
///
/// c conductances of the two halves, r and r' the rises weighted as in an inner face. So the
/// capillary flux stays that of Kirchhoff on either side and the head is continuous; the
/// derivatives of the flow follow from those of the two equations.

#include "solver/flow/curve_table.hpp"

namespace ringwright::solver {

struct HalfFace {
  const CurveTable* table = nullptr;
  double conductance = 0.0;                 ///< Ks times transmissibility of the half [m2/s]
  double rise_cell = 0.0, rise_face = 0.0;  ///< what K at the cell and at the face is multiplied by
                                            ///< in the gravity flow [m]
};

struct MaterialFlow {
  double q = 0.0;        ///< from a to b [m3/s]
  double slope_a = 0.0;  ///< dq/du_a [m2/s]
  double slope_b = 0.0;  ///< dq/du_b [m2/s]
};

/// @param head first guess of the face's head [m]; on return the head found
MaterialFlow material_flow(const HalfFace& a, const HalfFace& b, const CurvePoint& at_a,
                           const CurvePoint& at_b, double& head);

}  // namespace ringwright::solver
