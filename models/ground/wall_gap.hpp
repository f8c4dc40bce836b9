#pragma once
/// The open gap along a ring's wall as a material of the flow equation.
///
/// Two smooth parallel plates a width w apart carry water with the conductivity
///   K = rho g w^2 / (12 mu)                    (plane Poiseuille flow, textbook)
/// and hold it against a suction of  2 sigma / (rho g w)  (Laplace; wetting angle 0); at more
/// suction the gap is empty. The curves are Brooks & Corey's with that entry head and a steep
/// fall, theta_s = 1.
///
/// @checked tests/models/ground/wall_gap_test.cpp

#include "models/soil/curves.hpp"

namespace ringwright::models {

/// @param width w [m], > 0 @param viscosity_ratio mu over that at 20 degC [-]
/// @throws std::invalid_argument for a width not above 0
Soil wall_gap_material(double width, double viscosity_ratio = 1.0);

}  // namespace ringwright::models
