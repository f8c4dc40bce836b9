#pragma once
/// Questions for tests of the reading.

#include <string_view>

#include "postprocess/reading/answer.hpp"
#include "tests/solver/soils.hpp"

namespace ringwright::postprocess {

/// A ring of 10 cm radius driven 5 cm into a class soil of Carsel & Parrish 1988 at 300 cm
/// suction, 5 cm of water, two hours, read every six minutes.
inline Question ring_question(std::string_view texture) {
  Question q;
  q.setup.soil = solver::class_soil(texture);
  q.setup.initial_head = -3.0;
  q.setup.ring = {0.10, 0.05, 0.003};
  q.setup.pond_head = 0.05;
  q.setup.duration = 7200.0;
  q.reading_interval = 360.0;
  q.stop_readings = 3;
  q.stop_within = 0.05;
  q.assumed_alpha_star = 12.0;
  return q;
}

inline Question sandy_loam_question() { return ring_question("sandy loam"); }

}  // namespace ringwright::postprocess
