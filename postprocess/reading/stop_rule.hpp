#pragma once
#include <cstddef>
#include <optional>

#include "models/record/record.hpp"

namespace ringwright::postprocess {

/// First reading at which the last `readings` rates all lie within `within` of their mean: the
/// index of that reading, or none. Judged on the record as the crew has it, reading by reading.
std::optional<std::size_t> first_steady_reading(const models::Record& record, int readings,
                                                double within);

}  // namespace ringwright::postprocess
