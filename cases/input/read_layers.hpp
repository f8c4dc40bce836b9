#pragma once
/// The list `layers:` of the ground.

#include <optional>
#include <string>
#include <string_view>
#include <vector>

#include "cases/input/read_layer.hpp"

namespace ringwright::cases {

/// Appends the layers of the list, depths below the test level (negative above it); reports those
/// that are not in order.
/// @param own_soil the section itself has a soil, which is the uppermost layer
void read_layers(const SectionReader& section, const GroundContext& context, bool own_soil,
                 std::vector<GroundLayer>& layers, Reading& reading);

/// Without those wholly above the test level; the first then begins at it.
std::vector<GroundLayer> below_test_level(std::vector<GroundLayer> layers);

/// Every layer with the same number of readings of its soil: those of the same published table
/// go together, and what is known in one way goes with all.
std::vector<GroundLayer> paired(const SectionReader& section, std::vector<GroundLayer> layers,
                                Reading& reading);

/// Names of the layers from the test level down.
std::vector<std::string> layer_names(const Ground& ground);
/// The layer of that name, as it is spelt; none if there is none.
std::optional<std::string> layer_called(std::string_view name, const Ground& ground);

}  // namespace ringwright::cases
