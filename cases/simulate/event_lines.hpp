#pragma once
#include <string>

#include "postprocess/reading/answer.hpp"

namespace ringwright::cases {

/// What happens on the way to the stop, and when: emptied, filled up again, head lost and regained,
/// the next tank. Empty where nothing does.
std::string event_lines(const postprocess::Answer& answer);

/// Which stages of the program the stop leaves out; empty where all are run.
std::string stages_left_out(const postprocess::Answer& answer);

/// How deep the rate feels the ground; empty where that is not known.
std::string influence_line(const postprocess::Answer& answer);

/// What the gauge makes of the last reading where it is not what went into the ground, and the rate
/// of the outer ring; empty where there is nothing to tell.
std::string reading_lines(const postprocess::Answer& answer);

}  // namespace ringwright::cases
