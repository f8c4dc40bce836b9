#pragma once
#include <functional>
#include <vector>

#include "postprocess/reading/answer.hpp"
#include "solver/ground_materials.hpp"

namespace ringwright::postprocess {

/// The share by which the flow into the (inner) ring at the stop changes when Ks is doubled in all
/// ground below a depth [-]. The test is run twice, with and without, on the same mesh.
/// @param setup with the stop as its duration @param depth [m], > 0
/// @param keep_going asked after each step @return NaN if stopped, or where nothing flows
double influence_of(const solver::TestSetup& setup, double depth,
                    const solver::Resolution& resolution,
                    std::shared_ptr<const solver::CurveTable> table,
                    const std::function<bool()>& keep_going = {});

/// Depth below which that change is less than 5 %, to 2 % of itself, by bisection with coarse runs.
/// Known are depths within the ground wetted by the test and four times as far; a table or a drain
/// below may reach farther.
/// @param stop [s] @param wetted depth wetted until then [m] @param table of the uppermost soil
DepthOfInfluence depth_of_influence(const solver::TestSetup& setup, double stop, double wetted,
                                    std::shared_ptr<const solver::CurveTable> table,
                                    const std::function<bool()>& keep_going = {});

}  // namespace ringwright::postprocess
