#pragma once
/// Capillary length of a soil between an initial head h_i and saturation, and its inverse alpha*:
///
///   lambda(h_i) = 1/(1 - Kr_i)  integral from h_i to 0 of Kr dh,  Kr_i = Kr(h_i).
///
/// It does not depend on Ks and is 1/alpha for a Gardner soil, whatever h_i. From a dry start it
/// is the flux potential over Ks; a minimum capillary height counts in it. Quote h_i with lambda:
/// in fine soils a moist start makes it shorter.
///
/// @source White & Sully 1987, Water Resour. Res. 23:1514
/// @checked tests/models/soil/capillary_length_test.cpp

#include "models/soil/curves.hpp"

namespace ringwright::models {

/// lambda from dryness to saturation [m].
double capillary_length(const Curves& curves);

/// lambda from the head h_i [m] to saturation [m].
/// @throws std::invalid_argument if h_i is not below the entry head
double capillary_length(const Curves& curves, double h_i);

/// The same with Kr - Kr_i under the integral, for starts so wet that what the soil conducts
/// already should not count [m]; the shorter of the two, equal when dry.
double capillary_length_above_initial(const Curves& curves, double h_i);

}  // namespace ringwright::models
