#include "cases/input/case_ground.hpp"

#include "models/soil/moisture.hpp"

namespace ringwright::cases {

double initial_head(const Moisture& moisture, const models::Soil& soil) {
  if (moisture.hydrostatic_to) return -*moisture.hydrostatic_to;
  if (moisture.suction) return -*moisture.suction;
  if (moisture.water_content)
    return models::moisture_at_content(soil, *moisture.water_content).head;
  return models::moisture_at_saturation(soil, moisture.saturation.value_or(1.0)).head;
}

}  // namespace ringwright::cases
