#pragma once
/// What a test comes to at its stop, whatever kind of test it is.

#include <optional>

#include "postprocess/reading/answer.hpp"

namespace ringwright::cases {

/// When the test ends [s]; none where it was interrupted or dry before its first reading.
std::optional<double> stop_time(const postprocess::Answer& answer);

/// Rate into the ground in the last reading [m/s], as truly was; value 0: there is none.
postprocess::Figure rate_at_stop(const postprocess::Answer& answer);

/// Water to bring, of both rings [m3].
double water_to_bring(const postprocess::Answer& answer);

/// Whether a stop rule governs the test.
bool has_rule(const postprocess::Answer& answer);

/// The pair of heads a form would use: the last that gives a usable Kfs, the ground having had the
/// longest to settle; null where none does.
const postprocess::HeadPair* shown_pair(const postprocess::Answer& answer);

/// Two figures that a crew would write down differently: 5 % apart or more.
bool differ(double one, double other);

}  // namespace ringwright::cases
