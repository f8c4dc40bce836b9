#include "cases/simulate/question.hpp"

#include <algorithm>

#include "models/water/viscosity.hpp"

namespace ringwright::cases {

postprocess::Question question_of(const Test& test, const Ground& ground,
                                  const SoilVariant& variant, double accuracy, int threads) {
  const models::ConstantHead& protocol = test.protocol;
  postprocess::Question question;
  question.viscosity_ratio = models::viscosity_ratio(ground.water_temperature);
  question.setup.soil = variant.soil;
  question.setup.soil.Ks = variant.soil.Ks / question.viscosity_ratio;
  question.setup.initial_head = initial_head(ground.moisture, variant.soil);
  question.setup.ring = test.ring;
  question.setup.pond_head = protocol.head;
  question.setup.duration = protocol.longest;
  question.reading_interval =
      protocol.reading_interval.value_or(std::max(60.0, 0.05 * protocol.longest));
  if (protocol.stop) {
    question.stop_readings = protocol.stop->readings;
    question.stop_within = protocol.stop->within;
  }
  question.assumed_alpha_star = test.assumed_alpha_star;
  question.accuracy = accuracy;
  question.threads = threads;
  return question;
}

}  // namespace ringwright::cases
