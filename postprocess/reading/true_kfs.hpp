#pragma once
#include "postprocess/reading/answer.hpp"

namespace ringwright::postprocess {

/// The soil of the layer that holds the foot of the (inner) ring's wall; a foot that just reaches
/// the top of a layer stands in the one above.
const models::Soil& foot_soil(const solver::TestSetup& setup);

/// What readings are held against [m/s], at test temperature: what the question names, else Ks of
/// foot_soil().
double true_kfs(const Question& question);

}  // namespace ringwright::postprocess
