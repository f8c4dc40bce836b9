#pragma once
/// The case file once read: SI numbers, defaults filled in, every default listed.

#include <filesystem>
#include <optional>
#include <string>
#include <vector>

#include "models/protocol/constant_head.hpp"
#include "models/ring/single_ring.hpp"
#include "models/soil/curves.hpp"

namespace ringwright::cases {

/// A value that the user did not give.
struct Assumption {
  std::string key;   ///< where it could be given, e.g. "ground.water"
  std::string text;  ///< for the screen, e.g. "water 20 degC"
};

/// One reading of the user's words about the soil. A class name gives one per published table.
struct SoilVariant {
  std::string label;   ///< "silt loam" or the user's name
  std::string source;  ///< "Carsel & Parrish 1988", "case file"
  models::Soil soil;   ///< at 20 degC
};

/// Initial moisture; uniform suction. Content and saturation differ per variant and are derived.
struct Moisture {
  std::string words;                    ///< as given: "moist", "suction 300 cm", "25 %"
  std::optional<double> suction;        ///< [m], > 0
  std::optional<double> water_content;  ///< [-]
  std::optional<double> saturation;     ///< theta / theta_s [-]
};

struct Ground {
  std::vector<SoilVariant> variants;  ///< at least one
  Moisture moisture;
  double water_temperature = 20.0;  ///< [degC]
};

struct Test {
  std::string name;
  models::SingleRing ring;
  double wall_thickness = 0.003;  ///< [m]; also in ring.wall
  models::ConstantHead protocol;
  double assumed_alpha_star = 12.0;  ///< the crew's [1/m]
  double ruler = 0.001;              ///< how finely the level is read [m]
  double head_kept = 0.005;          ///< how well the head is kept, to either side [m]
};

struct Case {
  std::string job;             ///< free text
  std::filesystem::path file;  ///< empty when made from flags
  std::string text;            ///< the case text itself, for provenance
  double accuracy = 0.01;      ///< [-]
  Ground ground;
  std::vector<Test> tests;  ///< at least one
  std::vector<Assumption> assumed;
};

/// Initial pressure head [m] of a variant under a moisture.
/// @throws std::invalid_argument for a content not above theta_r or above theta_s
double initial_head(const Moisture& moisture, const models::Soil& soil);

}  // namespace ringwright::cases
