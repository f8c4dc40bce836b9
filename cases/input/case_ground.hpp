#pragma once
/// The section `ground:` once read. Depths count from the level the test stands on.

#include <optional>
#include <string>
#include <vector>

#include "models/ground/layer.hpp"
#include "models/soil/curves.hpp"

namespace ringwright::cases {

/// One reading of the user's words about the soil. A class name gives one per published table.
struct SoilVariant {
  std::string label;   ///< "silt loam" or the user's name
  std::string source;  ///< "Carsel & Parrish 1988", "case file"
  models::Soil soil;   ///< at 20 degC
};

/// Initial moisture; uniform suction, or hydrostatic. Content and saturation differ per variant
/// and are derived.
struct Moisture {
  std::string words;                    ///< as given: "moist", "suction 300 cm", "25 %"
  std::optional<double> suction;        ///< [m], > 0
  std::optional<double> water_content;  ///< [-]
  std::optional<double> saturation;     ///< theta / theta_s [-]
  std::optional<double> hydrostatic_to = std::nullopt;  ///< depth of a water table [m], > 0
};

/// A layer below the one the test stands on.
struct GroundLayer {
  double top = 0.0;  ///< depth of its upper edge [m]
  std::string name;
  std::vector<SoilVariant> variants;  ///< as many as the ground has, in the same order
  Moisture moisture;
};

struct Ground {
  std::vector<SoilVariant> variants;  ///< at least one; of the soil the test stands on
  Moisture moisture;                  ///< of that soil
  double water_temperature = 20.0;    ///< [degC]

  double test_level = 0.0;                ///< below the surface of the ground [m]
  std::vector<GroundLayer> layers_below;  ///< ascending
  std::optional<double> water_table;      ///< depth [m]
  std::optional<models::DisturbedSoil> disturbed;
  std::optional<models::WallGap> gap;
  std::optional<double> liner;        ///< thickness of a liner from the test level down [m]
  std::optional<double> wet_density;  ///< of the ground with its water [kg/m3]
  std::string truth_layer;  ///< whose Kfs is the true one; empty: that holding the wall's foot
};

/// Initial pressure head [m] of a variant under a moisture; of a hydrostatic state that at the
/// surface.
/// @throws std::invalid_argument for a content not above theta_r or above theta_s
double initial_head(const Moisture& moisture, const models::Soil& soil);

}  // namespace ringwright::cases
