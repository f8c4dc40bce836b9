#pragma once
#include <string>

#include "cases/simulate/simulation.hpp"

namespace ringwright::cases {

/// "14 mm/h at 10 degC (18 at 20 degC)", the true Kfs of an answer; at 20 degC once.
std::string true_kfs_words(const Case& what, const postprocess::Answer& answer);

/// What stands in place of a rate and a Kfs where nothing went into the ground in the last reading.
std::string no_rate_words(const Case& what, const postprocess::Answer& answer);

}  // namespace ringwright::cases
