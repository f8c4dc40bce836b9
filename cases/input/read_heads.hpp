#pragma once
/// What is done with the water in the ring: the keys `head`, `heads`, `fall`, `stages`, `pressure`
/// and `soak`, as stages one after the other.

#include <optional>
#include <vector>

#include "cases/input/section_reader.hpp"
#include "models/protocol/stage.hpp"

namespace ringwright::cases {

/// A stage as written: its duration may be left open.
struct StageWords {
  models::Stage stage;
  std::optional<double> duration;  ///< [s]
  std::optional<double> fall_to;   ///< the fall ends here [m]
  int falls = 1;                   ///< so many times
  std::optional<models::StepDown> down;
  std::optional<double> ramp;
  Place place;  ///< of its head
  Place duration_place;
};

struct HeadWords {
  std::vector<StageWords> stages;
  bool is_simple = false;  ///< one value under `head`
  bool ok = true;          ///< false: something was reported
};

/// @param depth under a lid, added to pressures [m]
HeadWords read_heads(const SectionReader& section, double depth, Reading& reading);

/// "5 cm for 30 min"; none if absent or wrong.
std::optional<StageWords> read_soak(const SectionReader& section, Reading& reading);

/// A constant head; `head` for the stage list too.
StageWords constant_stage(double head, const Place& place);

/// "from 20 cm to 5 cm", "from 20 cm for 1 h", "from 20 cm to 5 cm, 3 times".
std::optional<StageWords> read_fall(const SectionReader& section, Reading& reading);

/// The blocks of `stages`.
HeadWords read_stages(const SectionReader& section, Reading& reading);

}  // namespace ringwright::cases
