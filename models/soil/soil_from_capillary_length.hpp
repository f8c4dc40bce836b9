#pragma once
/// A soil that is known by its capillary length (or alpha*) and its fillable porosity only.
///
/// It gets Gardner curves with alpha = 1/lambda, whose capillary length is lambda whatever the
/// start, no residual water, and the theta_s at which the pores left empty at the initial head
/// h_i are the fillable porosity:
///
///   theta_s (1 - exp(alpha h_i)) = fillable porosity
///
/// @checked tests/models/soil/soil_from_capillary_length_test.cpp

#include "models/soil/curves.hpp"

namespace ringwright::models {

/// @param capillary_length lambda [m], > 0; for a class of alpha*, 1 / alpha*
/// @param fillable_porosity theta_s - theta(h_i) [-], in (0, 1)
/// @param Ks saturated conductivity [m/s], > 0
/// @param h_i initial head [m], < 0
/// @throws std::invalid_argument outside these ranges, or if theta_s came out at 1 or above: the
///   start is too wet for so much fillable porosity
Soil soil_from_capillary_length(double capillary_length, double fillable_porosity, double Ks,
                                double h_i);

/// The Gardner soil with the capillary length (from h_i), Ks and contents of another soil: what a
/// formula that knows lambda alone takes the soil for. theta(h_i) is kept;
/// theta_r may come out below 0 in a very wet start, which the flow does not feel.
/// @throws std::invalid_argument if h_i is not below the entry head
Soil matched_gardner(const Soil& soil, double h_i);

}  // namespace ringwright::models
