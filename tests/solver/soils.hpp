#pragma once
/// Soils for tests.

#include <memory>
#include <stdexcept>
#include <string>
#include <string_view>

#include "models/soil/catalogue.hpp"
#include "models/soil/gardner.hpp"

namespace ringwright::solver {

/// The class average of Carsel & Parrish 1988.
inline models::Soil class_soil(std::string_view texture) {
  for (const models::PublishedSoil& row : models::published_soils_of(texture))
    if (row.source == "Carsel & Parrish 1988") return models::make_soil(row);
  throw std::invalid_argument("no class " + std::string(texture));
}

/// @param alpha [1/m]
inline models::Soil gardner_soil(double alpha) {
  return {std::make_shared<models::Gardner>(alpha), 0.05, 0.40, 1e-5, 0.0};
}

}  // namespace ringwright::solver
