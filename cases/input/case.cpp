#include <stdexcept>

#include "cases/input/case.hpp"

namespace ringwright::cases {

double initial_head(const Moisture& moisture, const models::Soil& soil) {
  if (moisture.suction) return -*moisture.suction;
  const double content = moisture.water_content ? *moisture.water_content
                                                : moisture.saturation.value_or(0.0) * soil.theta_s;
  const double saturation = (content - soil.theta_r) / (soil.theta_s - soil.theta_r);
  if (!(saturation > 0.0 && saturation < 1.0)) {
    throw std::invalid_argument("the water content is not between residual and saturation");
  }
  return soil.curves->head_at(saturation);
}

}  // namespace ringwright::cases
