#pragma once
/// From the accuracy asked for to mesh and time tolerance.
///
/// What was measured on steady and transient rings (12 soils, radius 3 to 50 cm):
///  - the square cells at the foot of the wall bring an error of about +0.1 to +0.2 times
///    tip^2 / (a min(d, lambda)), a the radius, d the insertion, lambda the capillary length;
///  - the uppermost cells matter early: they must resolve the wetted depth;
///  - growth matters little once cell centres are geometric (grading.hpp);
///  - time errors fall away quickly: late volumes hardly notice the tolerance.
/// On 100 random tests at 1 % the true errors were: volumes median 0.25 %, nine in ten below
/// 0.6 %, the worst 1.0 %; rates over a reading interval median 0.35 %, nine in ten below 0.8 %,
/// the worst 2.2 %. The error of an answer is not taken from these rules but estimated from
/// companion runs; since that estimate is two to four times the error, answers begin finer
/// (postprocess/reading/answer_question.cpp).
///
/// With more than one ring or soil the smallest cell that any of them asks for is taken, and lines
/// close to a foot (another foot, the top of a layer, the border of disturbed soil) ask for
/// cells of at most half their distance, down to an eighth.

#include "solver/virtual_test.hpp"

namespace ringwright::solver {

/// @param accuracy relative, of every promised figure [-]
/// @param capillary_length of the uppermost soil [m]; those of the layers come from their curves
/// @param first_time when the first volume is promised [s]
Resolution resolution_for(const TestSetup& setup, double accuracy, double capillary_length,
                          double first_time);

}  // namespace ringwright::solver
