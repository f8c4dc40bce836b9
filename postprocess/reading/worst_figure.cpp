#include "postprocess/reading/worst_figure.hpp"

#include <algorithm>

namespace ringwright::postprocess {

WorstFigure worse_of(const WorstFigure& a, const WorstFigure& b) {
  return {std::max(a.relative_error, b.relative_error), std::max(a.mesh_part, b.mesh_part),
          std::max(a.time_part, b.time_part)};
}

}  // namespace ringwright::postprocess
