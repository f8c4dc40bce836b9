#pragma once
/// When a test is read and for which stopping times it is reported.

#include <vector>

namespace ringwright::postprocess {

/// Reading interval when none is given: the longer of one minute and 5 % of the test [s].
double default_reading_interval(double longest);

/// Ends of the reading intervals [s]: every interval, and the end of the test.
std::vector<double> reading_times(double interval, double longest);

/// Times a person would consider stopping at, in (0, longest] [s]: 1, 2, 5, 10, 15, 30 min, 1, 2,
/// 3, 4, 6, 8, 12 h, days; those that hold at least one reading interval.
std::vector<double> stopping_times(double interval, double longest);

/// The rows of the ladder: up to `rows` stopping times around the stop, the stop itself and the
/// longest time [s], ascending.
std::vector<double> ladder_times(double interval, double stop, double longest, std::size_t rows);

}  // namespace ringwright::postprocess
