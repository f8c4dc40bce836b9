#pragma once
/// Questions with stages and with two rings.

#include "tests/postprocess/reading/ring_question.hpp"

namespace ringwright::postprocess {

/// 5 cm, 15 cm, 5 cm, each for 20 min, in sandy loam; bailed down; read every 5 min, no stop rule.
inline Question two_head_question() {
  Question q = sandy_loam_question();
  q.stop_readings = 0;
  q.reading_interval = 300.0;
  q.find_influence = false;
  for (double head : {0.05, 0.15, 0.05})
    q.setup.program.stages.push_back(
        {.head = head, .duration = 1200.0, .down = models::StepDown::bail});
  q.setup.duration = 3600.0;
  return q;
}

/// 30 and 60 cm wide, both 10 cm into sandy loam under 5 cm of water for an hour.
inline Question double_ring_question() {
  Question q = sandy_loam_question();
  q.stop_readings = 0;
  q.reading_interval = 300.0;
  q.find_influence = false;
  q.setup.ring = {0.15, 0.10, 0.003};
  q.setup.outer_ring = models::SingleRing{0.30, 0.10, 0.003};
  q.setup.duration = 3600.0;
  return q;
}

/// A fall from 20 cm for an hour.
inline Question fall_question() {
  Question q = two_head_question();
  q.setup.program.stages = {
      {.kind = models::StageKind::free_fall, .head = 0.20, .duration = 3600.0}};
  return q;
}

}  // namespace ringwright::postprocess
