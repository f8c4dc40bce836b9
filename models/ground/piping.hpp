#pragma once
/// Water under pressure in shallow ground: when it may lift or crack the soil.
///
/// Piping. If the wall leaks freely, the head H drives water down inside and up outside it, over
/// the path 2 d. The index H/(2 d) is that mean gradient; soil without cohesion is carried away
/// where the upward gradient reaches
///   i_c = (rho_s/rho_w - 1)(1 - porosity),   about 0.9 to 1.0
///
/// Fracture. At the foot of the wall water stands under H + d, the soil above weighs rho_b g d.
/// Where the first is more, and neither cohesion nor friction holds, the ground may crack:
///   margin = rho_b d / (rho_w (H + d)),   below 1 not safe
///
/// Both are rough bounds that leave out what usually helps; they tell when to ask an engineer.
///
/// @source Terzaghi's critical gradient as in textbooks of soil mechanics (from memory); the index
///   and the margin follow from the statements above (derivation)
/// @checked tests/models/ground/piping_test.cpp

namespace ringwright::models {

/// H/(2 d) [-]. @param head H at the soil surface [m], >= 0 @param insertion d [m], >= 0
/// @return infinity for a head above 0 over a ring that is not driven in
/// @throws std::invalid_argument for values out of range
double piping_index(double head, double insertion);

/// i_c [-]. @param porosity [-], 0 to 1 @param grain_density rho_s [kg/m3]
/// @throws std::invalid_argument for values out of range
double critical_exit_gradient(double porosity, double grain_density = 2650.0);

/// [-]; below 1 the water pressure at the foot of the wall exceeds the weight of the soil above.
/// @param bulk_density rho_b of the soil above, with its water [kg/m3], > 0
/// @throws std::invalid_argument for values out of range
double fracture_margin(double head, double insertion, double bulk_density);

/// Head at which the margin is 1 [m], not below 0.
double fracture_head(double insertion, double bulk_density);

}  // namespace ringwright::models
