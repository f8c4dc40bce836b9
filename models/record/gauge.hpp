#pragma once
/// What stands between the water and the form: a gauge with divisions, an eye, a ruler.

#include <cstdint>
#include <vector>

#include "models/record/record.hpp"

namespace ringwright::models {

struct Gauge {
  double volume_division = 0.0;  ///< one division of the gauge as a volume [m3]; 0: exact
  double random_error = 0.0;     ///< standard deviation of one reading of the gauge [m3]
  double head_division = 0.0;    ///< of the ruler [m]; 0: exact
  double head_tolerance = 0.0;   ///< a head is misread by up to this to either side, the same
                                 ///< amount all through a stage [m]
  std::uint64_t seed = 1;
};

/// The record as the crew has it: total volumes rounded to the division after the random error,
/// volumes of the intervals as differences of those, heads misread (evenly within the tolerance)
/// and rounded. The gauge stands at exactly 0 at time 0; where a reading does not follow on the one
/// before, it is read at the start of the interval as well. A volume may come out below 0, a head
/// that truly is not below 0 does not. All rows are kept, times are exact. The same gauge gives the
/// same record on every machine.
/// @param stage_starts times at which a stage begins [s], ascending: a new misreading of the head
/// @throws std::invalid_argument for a value of the gauge below 0, or stages out of order
/// @source common practice, no source (errors normal, misreadings uniform)
/// @checked tests/models/record/gauge_test.cpp
Record as_read(const Record& truth, const Gauge& gauge, const std::vector<double>& stage_starts);

}  // namespace ringwright::models
