#include "postprocess/reading/true_kfs.hpp"

namespace ringwright::postprocess {

const models::Soil& foot_soil(const solver::TestSetup& setup) {
  const models::Soil* soil = &setup.soil;
  for (const models::Layer& layer : setup.layers_below)
    if (layer.top < setup.ring.insertion) soil = &layer.soil;
  return *soil;
}

double true_kfs(const Question& question) {
  return question.true_Kfs.value_or(foot_soil(question.setup).Ks);
}

}  // namespace ringwright::postprocess
