#include "postprocess/results/supplied.hpp"

#include <algorithm>

namespace ringwright::postprocess {

double supplied_until(const Answer& answer, const models::Reading& reading) {
  const auto& samples = answer.run.samples;
  const auto at = std::lower_bound(
      samples.begin(), samples.end(), reading.time * (1.0 - 1e-9),
      [](const solver::Sample& sample, double time) { return sample.time < time; });
  const bool sampled = at != samples.end() && at->time <= reading.time * (1.0 + 1e-9);
  if (sampled && !answer.question.setup.program.stages.empty()) return at->water.supply;
  return reading.total_volume + answer.filling_volume;
}

}  // namespace ringwright::postprocess
