#pragma once
#include <functional>
#include <optional>
#include <vector>

#include "postprocess/reading/answer.hpp"
#include "solver/ground_materials.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::postprocess {

/// The last time at which the flow is more than 5 % from the steady flow, from above or below,
/// found by running on in a domain of its own for up to 1000 h. Heads are held all that time by a
/// supply that keeps up; incidents are left out.
/// @param setup with one constant head in each ring
/// @param resolution of the run on and of the steady flow it is held against
/// @param keep_going asked after each step @return none when it said no
std::optional<TimeToSteady> time_to_steady(const solver::TestSetup& setup,
                                           const solver::Resolution& resolution,
                                           const std::vector<solver::Material>& materials,
                                           const std::function<bool()>& keep_going = {});

}  // namespace ringwright::postprocess
