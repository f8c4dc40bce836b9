#include "cases/simulate/pond_programs.hpp"

#include <algorithm>
#include <numbers>

#include "cases/input/read_supply.hpp"

namespace ringwright::cases {
namespace {

std::optional<models::Vessel> vessel_of(const Test& test) {
  if (test.vessel == VesselKind::ring) return std::nullopt;
  models::Vessel vessel;
  vessel.area = vessel_area(test);
  if (!test.lid) return vessel;
  vessel.base_head = test.lid->underside;
  vessel.still_volume =
      std::numbers::pi * test.ring.radius * test.ring.radius * test.lid->underside;
  return vessel;
}

}  // namespace

models::PondProgram pond_program(const Test& test) {
  models::PondProgram program;
  program.stages = test.program.stages;
  if (program.stages.empty()) return program;
  program.supply = test.program.supply;
  if (const auto vessel = vessel_of(test)) program.vessel = *vessel;
  // Nothing evaporates from under a lid or a seal.
  if (!test.lid && !test.sealed_volume) program.evaporation = test.evaporation;
  program.empty = test.program.empty;
  return program;
}

models::PondProgram outer_pond_program(const Test& test) {
  models::PondProgram program;
  program.stages = test.outer.stages;
  if (program.stages.empty()) return program;
  program.supply = test.outer.supply;
  program.evaporation = test.evaporation;
  program.empty = test.outer.empty;
  return program;
}

std::size_t variant_index(const Ground& ground, const SoilVariant& variant) {
  const auto found = std::find_if(
      ground.variants.begin(), ground.variants.end(), [&](const SoilVariant& candidate) {
        return candidate.source == variant.source && candidate.label == variant.label;
      });
  return found == ground.variants.end() ? 0
                                        : static_cast<std::size_t>(found - ground.variants.begin());
}

}  // namespace ringwright::cases
