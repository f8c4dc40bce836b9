#pragma once
/// The wetness of a soil, said in every way at once: whoever gives one of them sees the others.
///
/// The same word, or the same suction, is very different water in sand and in clay.
///
/// @checked tests/models/soil/moisture_test.cpp

#include <optional>
#include <span>
#include <string_view>

#include "models/soil/curves.hpp"

namespace ringwright::models {

struct MoistureState {
  double head = 0.0;                  ///< pressure head h [m], <= 0
  double suction = 0.0;               ///< -h [m]
  double water_content = 0.0;         ///< theta [-]
  double degree_of_saturation = 0.0;  ///< theta / theta_s [-]
  double effective_saturation = 0.0;  ///< (theta - theta_r) / (theta_s - theta_r) [-]
};

struct MoistureWord {
  std::string_view word;
  double suction;  ///< [m]
};

/// dry, moist, wet: suctions of 3000, 300 and 60 cm (common practice, no source).
std::span<const MoistureWord> moisture_words();

/// Suction of a word [m]; none for an unknown word.
std::optional<double> suction_of_word(std::string_view word);

/// @param suction [m], >= 0 @throws std::invalid_argument otherwise
MoistureState moisture_at_suction(const Soil& soil, double suction);

/// @param theta [-], in (theta_r, theta_s] @throws std::invalid_argument otherwise
MoistureState moisture_at_content(const Soil& soil, double theta);

/// @param degree theta / theta_s [-], in (theta_r / theta_s, 1]
/// @throws std::invalid_argument otherwise
MoistureState moisture_at_saturation(const Soil& soil, double degree);

}  // namespace ringwright::models
