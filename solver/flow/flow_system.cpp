#include "solver/flow/flow_system.hpp"

#include <cmath>
#include <limits>
#include <stdexcept>

namespace ringwright::solver {
namespace {

constexpr double kFar = std::numeric_limits<double>::max();

// Weight of the first cell in the gravity flow; rise > 0: the first cell is upstream.
double gravity_weight(double rise, double capillary_length) {
  const double p = rise / (2.0 * capillary_length);
  if (std::abs(p) < 1e-3) return 0.5 + p / 6.0;
  return 0.5 * (1.0 + 1.0 / std::tanh(p) - 1.0 / p);
}

double directed_Ks(const models::Soil& soil, bool horizontal) {
  return horizontal ? soil.Ks * soil.anisotropy : soil.Ks;
}

}  // namespace

FlowSystem::FlowSystem(const CellsAndFaces& mesh, std::vector<Material> materials,
                       std::vector<Condition> conditions, std::vector<Pond> ponds)
    : cells_(mesh.cells()),
      patches_(static_cast<int>(mesh.patches.size())),
      materials_(std::move(materials)),
      soil_(mesh.soil),
      conditions_(std::move(conditions)),
      feeds_(ponds.size()),
      pond_of_patch_(mesh.patches.size(), -1),
      volume_(mesh.volume),
      point_(mesh.volume.size()),
      u_(mesh.volume.size()),
      totals_(mesh.patches.size() + 2 * ponds.size()) {
  if (conditions_.size() != mesh.patches.size())
    throw std::invalid_argument("one condition per boundary patch is needed");
  for (int index : soil_)
    if (index < 0 || static_cast<std::size_t>(index) >= materials_.size())
      throw std::invalid_argument("the mesh has a soil that is not among the materials");
  for (int i = 0; i < cells_; ++i) {
    const Material& m = material(i);
    fillable_.push_back(m.soil.theta_s - m.soil.theta_r);
    specific_storage_.push_back(m.soil.specific_storage);
    bounds_.push_back({m.table->driest(), m.table->entry(), m.table->switch_point()});
    if (stretches_.empty() || stretches_.back().table != m.table.get())
      stretches_.push_back({static_cast<std::size_t>(i), 0, m.table.get()});
    stretches_.back().end = static_cast<std::size_t>(i) + 1;
  }
  for (const Face& f : mesh.faces) add_face(f);
  for (const BoundaryFace& f : mesh.boundary) add_outer_face(f);
  for (const Pond& pond : ponds) add_pond(pond);
  build_pattern();
  for (int k = 0; k < patches_; ++k)
    set_condition(k, conditions_[static_cast<std::size_t>(k)], 0.0);
}

FlowSystem::FlowSystem(const CellsAndFaces& mesh, const models::Soil& soil,
                       std::shared_ptr<const CurveTable> table, std::vector<Condition> conditions)
    : FlowSystem(mesh, {Material{soil, std::move(table)}}, std::move(conditions)) {}

void FlowSystem::add_face(const Face& f) {
  const Material &a = material(f.a), &b = material(f.b);
  if (soil_[static_cast<std::size_t>(f.a)] == soil_[static_cast<std::size_t>(f.b)]) {
    const double w = gravity_weight(f.rise, a.table->capillary_length());
    inner_.push_back({f.a, f.b, directed_Ks(a.soil, f.horizontal) * f.transmissibility, w * f.rise,
                      (1 - w) * f.rise, 0, 0, 0, 0});
    return;
  }
  const double rise_a = f.part_a * f.rise, rise_b = (1 - f.part_a) * f.rise;
  const double w_a = gravity_weight(rise_a, a.table->capillary_length());
  const double w_b = gravity_weight(rise_b, b.table->capillary_length());
  MixedFace face{f.a, f.b, {}, {}};
  face.half_a = {a.table.get(), directed_Ks(a.soil, f.horizontal) * f.transmissibility / f.part_a,
                 w_a * rise_a, (1 - w_a) * rise_a};
  face.half_b = {b.table.get(),
                 directed_Ks(b.soil, f.horizontal) * f.transmissibility / (1 - f.part_a),
                 (1 - w_b) * rise_b, w_b * rise_b};
  mixed_.push_back(face);
}

void FlowSystem::add_outer_face(const BoundaryFace& f) {
  const Material& m = material(f.cell);
  const double w = gravity_weight(f.rise, m.table->capillary_length());
  outer_.push_back({f.cell, f.patch, 0, directed_Ks(m.soil, f.horizontal) * f.transmissibility,
                    w * f.rise, (1 - w) * f.rise, f.area, f.normal_down, f.position});
}

void FlowSystem::add_pond(const Pond& pond) {
  if (!(pond.area > 0.0) || !(pond.scale > 0.0))
    throw std::invalid_argument("a pond needs an area and a scale above 0");
  pond_of_patch_[static_cast<std::size_t>(pond.patch)] = ponds();
  ponds_.push_back(pond);
  volume_.push_back(pond.area * pond.scale);
  fillable_.push_back(1.0);
  specific_storage_.push_back(0.0);
  bounds_.push_back({-kFar, pond.base_head, -kFar});
  point_.push_back({});
  u_.push_back(0.0);
}

void FlowSystem::build_pattern() {
  const std::size_t n = volume_.size();
  std::vector<std::vector<int>> column(n);
  const auto join = [&](int a, int b) {
    column[static_cast<std::size_t>(a)].push_back(b);
    column[static_cast<std::size_t>(b)].push_back(a);
  };
  for (std::size_t i = 0; i < n; ++i) column[i].push_back(static_cast<int>(i));
  for (const InnerFace& f : inner_) join(f.a, f.b);
  for (const MixedFace& f : mixed_) join(f.a, f.b);
  for (const OuterFace& f : outer_)
    if (const int pond = pond_of_patch_[static_cast<std::size_t>(f.patch)]; pond >= 0)
      join(f.cell, pond_unknown(pond));
  pattern_.column_starts.push_back(0);
  for (std::size_t i = 0; i < n; ++i) {
    std::sort(column[i].begin(), column[i].end());
    column[i].erase(std::unique(column[i].begin(), column[i].end()), column[i].end());
    pattern_.rows.insert(pattern_.rows.end(), column[i].begin(), column[i].end());
    pattern_.column_starts.push_back(static_cast<int>(pattern_.rows.size()));
  }
  const auto entry = [&](int row, int col) {
    const auto begin =
        pattern_.rows.begin() + pattern_.column_starts[static_cast<std::size_t>(col)];
    const auto end =
        pattern_.rows.begin() + pattern_.column_starts[static_cast<std::size_t>(col) + 1];
    return static_cast<int>(std::lower_bound(begin, end, row) - pattern_.rows.begin());
  };
  for (std::size_t i = 0; i < n; ++i)
    pattern_.diagonal.push_back(entry(static_cast<int>(i), static_cast<int>(i)));
  const auto place = [&](auto& f) {
    f.aa = entry(f.a, f.a), f.ab = entry(f.a, f.b);
    f.ba = entry(f.b, f.a), f.bb = entry(f.b, f.b);
  };
  for (InnerFace& f : inner_) place(f);
  for (MixedFace& f : mixed_) place(f);
  for (OuterFace& f : outer_) {
    f.diagonal = pattern_.diagonal[static_cast<std::size_t>(f.cell)];
    const int pond = pond_of_patch_[static_cast<std::size_t>(f.patch)];
    if (pond < 0) continue;
    f.cell_pond = entry(f.cell, pond_unknown(pond));
    f.pond_cell = entry(pond_unknown(pond), f.cell);
  }
}

void FlowSystem::set_condition(int patch, Condition condition, double t) {
  const auto k = static_cast<std::size_t>(patch);
  if (condition.kind == Boundary::pond && pond_of_patch_[k] < 0)
    throw std::invalid_argument("no pond was declared on this patch");
  conditions_[k] = std::move(condition);
  varies_ = std::any_of(conditions_.begin(), conditions_.end(),
                        [](const Condition& c) { return c.varies_in_time; });
  for (OuterFace& f : outer_)
    if (f.patch == patch) update(f, t);
}

}  // namespace ringwright::solver
