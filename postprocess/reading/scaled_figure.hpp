#pragma once
#include <cmath>

#include "postprocess/reading/answer.hpp"

namespace ringwright::postprocess {

/// A figure times a number without error.
inline Figure scaled(const Figure& figure, double factor) {
  return {figure.value * factor, figure.error * std::abs(factor)};
}

}  // namespace ringwright::postprocess
