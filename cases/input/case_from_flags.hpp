#pragma once
/// A case from command-line flags alone.
///
/// The flags are composed into a case text and read by the same reader as any file, so that
/// there is one grammar and one set of checks; errors name the flag instead of a line.

#include <optional>
#include <string>

#include "cases/input/case.hpp"

namespace ringwright::cases {

/// Values of the flags as typed; each is the value of one key of a case file.
struct CaseFlags {
  std::optional<std::string> job;                 ///< --job
  std::optional<std::string> accuracy;            ///< --accuracy "1 %"
  std::optional<std::string> water;               ///< --water "10 degC"
  std::optional<std::string> soil;                ///< --soil "silt loam, moist"
  std::optional<std::string> published;           ///< --published
  std::optional<std::string> Kfs;                 ///< --Kfs "18 mm/h at 20 degC"
  std::optional<std::string> moisture;            ///< --moisture "suction 300 cm"
  std::optional<std::string> capillary_length;    ///< --capillary-length "8 cm"
  std::optional<std::string> alpha_star;          ///< --alpha-star "0.12 1/cm"
  std::optional<std::string> fillable_porosity;   ///< --fillable-porosity "25 %"
  std::optional<std::string> capillary_height;    ///< --minimum-capillary-height "-2 cm"
  std::optional<std::string> ring;                ///< --ring "30 cm", inner diameter
  std::optional<std::string> insert;              ///< --insert "10 cm"
  std::optional<std::string> head;                ///< --head "5 cm"
  std::optional<std::string> heads;               ///< --heads "5 cm then 15 cm, each for 1 h"
  std::optional<std::string> fall;                ///< --fall "from 20 cm to 5 cm"
  std::optional<std::string> soak;                ///< --soak "5 cm for 30 min"
  std::optional<std::string> outer_ring;          ///< --outer-ring "60 cm", inner diameter
  std::optional<std::string> outer_insert;        ///< --outer-insert "15 cm"
  std::optional<std::string> outer_head;          ///< --outer-head "5 cm"
  std::optional<std::string> wall;                ///< --wall "3 mm"
  std::optional<std::string> supply;              ///< --supply "6 L/min"
  std::optional<std::string> reservoir;           ///< --reservoir "200 L"
  std::optional<std::string> gauge;               ///< --gauge "10 mL"
  std::optional<std::string> test_level;          ///< --test-level "60 cm"
  std::optional<std::string> water_table;         ///< --water-table "2 m"
  std::optional<std::string> stop;                ///< --stop "after 6 h"
  std::optional<std::string> read;                ///< --read "every 10 min"
  std::optional<std::string> assumed_alpha_star;  ///< --assumed-alpha-star "0.12 1/cm"
};

/// The case text the flags stand for; it can be saved and read as a case file.
std::string case_text(const CaseFlags& flags);

/// The case the flags describe.
/// @throws CaseErrors naming flags
Case case_from_flags(const CaseFlags& flags);

}  // namespace ringwright::cases
