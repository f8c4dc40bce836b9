#pragma once
#include "postprocess/reading/answer.hpp"

namespace ringwright::postprocess {

/// Whether the (inner) ring is closed by a lid under pressure: the lid is known, or the water is
/// pressed by air, or its level moves in a vessel above a full ring.
inline bool is_closed_ring(const Question& question) {
  const auto& vessel = question.setup.program.vessel;
  return question.circumstances.lid || (vessel && (vessel->area == 0.0 || vessel->base_head > 0.0));
}

}  // namespace ringwright::postprocess
