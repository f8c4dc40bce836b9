#pragma once
/// How hard the water lifts a lid, and what holds it down.
///
///   lift    = rho g (H_relief - z_lid) pi r_seal^2        rho at 20 degC
///   ballast = factor * lift / g - mass                    not below 0
///
/// The highest head the supply can reach counts (overflow, relief valve, or pump with its valve
/// open), not the head that was set, and the area out to the seal, not the bore. What air under the
/// lid is pressed to counts the same. Friction of the wall in the ground is left out. The clamps
/// carry the lift as well; this is no design of a lid, which a competent person makes by the local
/// rules for pressure equipment.
///
/// @source hydrostatics; the factor 1.5 is engineering judgement, no source
/// @checked tests/models/ring/lid_lift_test.cpp

#include "models/ring/lid.hpp"

namespace ringwright::models {

inline constexpr double default_ballast_factor = 1.5;  ///< on the lift [-]
inline constexpr double heaviest_piece = 20.0;         ///< that one person lifts [kg]

struct LidLift {
  double force = 0.0;      ///< of the water on the lid, upwards [N]
  double net_force = 0.0;  ///< less the weight of lid and ring [N]; above 0: it lifts
  double ballast = 0.0;    ///< mass to lay on [kg]
  int pieces = 0;          ///< of at most 20 kg each
};

/// Force of the water on an area out to the seal [N].
/// @param head of the water at the lid's underside [m], >= 0 @param seal_radius [m], > 0
/// @throws std::invalid_argument for values out of range
double lid_force(double head, double seal_radius);

/// Mass to lay on a lid [kg]. @param force upwards [N] @param mass that resists already [kg]
/// @param factor on the lift [-], >= 1
double ballast_mass(double force, double mass, double factor = default_ballast_factor);

/// Number of pieces of at most 20 kg that make up a mass [kg].
int ballast_pieces(double mass);

/// @param highest_head that the supply can reach, above the soil surface [m]: the lid's relief
///   head, or what is known of the supply where that is not stated
/// @param inner_radius of the ring [m], used where the lid states no seal
LidLift lid_lift(const Lid& lid, double highest_head, double inner_radius,
                 double factor = default_ballast_factor);

}  // namespace ringwright::models
