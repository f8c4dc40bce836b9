#include "solver/mesh/tip_correction.hpp"

#include <cmath>

namespace ringwright::solver {

double tip_factor(TipPoint p, TipPoint q, TipPoint a, TipPoint b) {
  const double exact = std::abs(std::sqrt(q).real() - std::sqrt(p).real());
  const double difference = std::abs(std::sqrt(b).imag() - std::sqrt(a).imag());
  return exact / (difference / std::abs(b - a) * std::abs(q - p));
}

}  // namespace ringwright::solver
