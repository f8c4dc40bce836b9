#include "solver/ground_materials.hpp"

#include <algorithm>
#include <stdexcept>

#include "models/ground/wall_gap.hpp"

namespace ringwright::solver {
namespace {

int layers(const TestSetup& setup) { return 1 + static_cast<int>(setup.layers_below.size()); }

const models::Soil& layer_soil(const TestSetup& setup, int layer) {
  return layer == 0 ? setup.soil : setup.layers_below[static_cast<std::size_t>(layer) - 1].soil;
}

int layer_at(const TestSetup& setup, double depth) {
  int layer = 0;
  for (const models::Layer& below : setup.layers_below) layer += depth >= below.top;
  return layer;
}

}  // namespace

int layer_index(const TestSetup&, int layer) { return layer; }

int disturbed_index(const TestSetup& setup, int layer) {
  if (!setup.disturbed) throw std::invalid_argument("this ground has no disturbed soil");
  return layers(setup) + layer;
}

int gap_index(const TestSetup& setup) {
  if (!setup.gap) throw std::invalid_argument("this ground has no gap along the wall");
  return layers(setup) * (setup.disturbed ? 2 : 1);
}

std::vector<Material> ground_materials(const TestSetup& setup,
                                       std::shared_ptr<const CurveTable> table) {
  std::vector<Material> materials;
  const auto add = [&](const models::Soil& soil) {
    const auto same = std::find_if(materials.begin(), materials.end(),
                                   [&](const Material& m) { return m.soil.curves == soil.curves; });
    auto own = same != materials.end() ? same->table : nullptr;
    if (materials.empty()) own = std::move(table);
    if (!own) own = std::make_shared<CurveTable>(soil.curves);
    materials.push_back({soil, std::move(own)});
  };
  for (int k = 0; k < layers(setup); ++k) add(layer_soil(setup, k));
  if (setup.disturbed)
    for (int k = 0; k < layers(setup); ++k) {
      models::Soil soil = layer_soil(setup, k);
      soil.Ks *= setup.disturbed->factor;
      add(soil);
    }
  if (setup.gap) add(models::wall_gap_material(setup.gap->width));
  return materials;
}

double head_before(const TestSetup& setup, int soil_index, double elevation) {
  if (setup.water_table) return -*setup.water_table - elevation;
  int layer = soil_index;
  if (setup.gap && soil_index == gap_index(setup))
    layer = layer_at(setup, -elevation);
  else if (soil_index >= layers(setup))
    layer -= layers(setup);
  return layer == 0 ? setup.initial_head
                    : setup.layers_below[static_cast<std::size_t>(layer) - 1].initial_head;
}

}  // namespace ringwright::solver
