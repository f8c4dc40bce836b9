#pragma once
/// When a test ends: the key `stop`, and `also judge`.

#include <optional>
#include <vector>

#include "cases/input/section_reader.hpp"
#include "models/protocol/stop_rule.hpp"

namespace ringwright::cases {

struct StopWords {
  std::optional<models::StopRule> rule;  ///< of any kind but a time, unless a preset
  std::optional<double> longest;         ///< [s]
};

/// "after 6 h", "3 readings within 5 %", "4 readings within 6 mm/h, or 8 h", "after 20 L, or 8 h",
/// or the name of a preset (models/protocol/stop_rule.hpp).
std::optional<StopWords> read_stop(const SectionReader& section, Reading& reading);

/// The rules of `also judge`, without those reported as wrong.
std::vector<models::StopRule> read_also_judge(const SectionReader& section, Reading& reading);

}  // namespace ringwright::cases
