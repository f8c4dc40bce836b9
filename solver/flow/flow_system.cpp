#include "solver/flow/flow_system.hpp"

#include <algorithm>
#include <cmath>
#include <stdexcept>

namespace ringwright::solver {
namespace {

// Weight of the first cell in the gravity flow; rise > 0: the first cell is upstream.
double gravity_weight(double rise, double capillary_length) {
  const double p = rise / (2.0 * capillary_length);
  if (std::abs(p) < 1e-3) return 0.5 + p / 6.0;
  return 0.5 * (1.0 + 1.0 / std::tanh(p) - 1.0 / p);
}

}  // namespace

FlowSystem::FlowSystem(const CellsAndFaces& mesh, const models::Soil& soil,
                       std::shared_ptr<const CurveTable> table, std::vector<Condition> conditions)
    : soil_(soil),
      table_(std::move(table)),
      conditions_(std::move(conditions)),
      fillable_(soil.theta_s - soil.theta_r),
      volume_(mesh.volume),
      point_(mesh.volume.size()),
      u_(mesh.volume.size()),
      patch_outflow_(mesh.patches.size()) {
  if (conditions_.size() != mesh.patches.size())
    throw std::invalid_argument("one condition per boundary patch is needed");
  if (std::any_of(mesh.soil.begin(), mesh.soil.end(),
                  [&](int index) { return index != mesh.soil.front(); }))
    throw std::invalid_argument("the flow takes one material, the mesh holds several");
  const double lambda = table_->capillary_length();
  for (const Face& f : mesh.faces) {
    const double w = gravity_weight(f.rise, lambda);
    inner_.push_back(
        {f.a, f.b, soil.Ks * f.transmissibility, w * f.rise, (1 - w) * f.rise, 0, 0, 0, 0});
  }
  for (const BoundaryFace& f : mesh.boundary) {
    if (conditions_[static_cast<std::size_t>(f.patch)].kind == Boundary::closed) continue;
    const double w = gravity_weight(f.rise, lambda);
    outer_.push_back({f.cell, f.patch, 0, soil.Ks * f.transmissibility, w * f.rise,
                      (1 - w) * f.rise, f.area, f.normal_down, f.position});
  }
  build_pattern(mesh);
  for (const Condition& c : conditions_) varies_ = varies_ || c.varies_in_time;
  for (OuterFace& f : outer_) update(f, 0.0);
}

void FlowSystem::build_pattern(const CellsAndFaces& mesh) {
  const auto n = mesh.volume.size();
  std::vector<std::vector<int>> column(n);
  for (std::size_t i = 0; i < n; ++i) column[i].push_back(static_cast<int>(i));
  for (const Face& f : mesh.faces) {
    column[static_cast<std::size_t>(f.a)].push_back(f.b);
    column[static_cast<std::size_t>(f.b)].push_back(f.a);
  }
  pattern_.column_starts.push_back(0);
  for (std::size_t i = 0; i < n; ++i) {
    std::sort(column[i].begin(), column[i].end());
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
  for (InnerFace& f : inner_) {
    f.aa = entry(f.a, f.a), f.ab = entry(f.a, f.b);
    f.ba = entry(f.b, f.a), f.bb = entry(f.b, f.b);
  }
  for (OuterFace& f : outer_) f.diagonal = pattern_.diagonal[static_cast<std::size_t>(f.cell)];
}

void FlowSystem::update(OuterFace& f, double t) {
  const Condition& c = conditions_[static_cast<std::size_t>(f.patch)];
  if (c.kind == Boundary::head) {
    const CurvePoint p = table_->at(table_->u_of_head(c.value(t, f.position)));
    f.Phi = p.Phi, f.K = p.K;
  } else if (c.kind == Boundary::seepage) {
    f.Phi = table_->at(0.0).Phi, f.K = 1.0;
  } else if (c.kind == Boundary::flux) {
    f.flux = c.value(t, f.position);
  }
}

void FlowSystem::set_time(double t) {
  if (!varies_) return;
  for (OuterFace& f : outer_)
    if (conditions_[static_cast<std::size_t>(f.patch)].varies_in_time) update(f, t);
}

void FlowSystem::set_state(std::span<const double> u) {
  for (std::size_t i = 0; i < point_.size(); ++i) {
    u_[i] = u[i];
    point_[i] = table_->at(u[i]);
  }
}

double FlowSystem::storage_of_u(double u) const {
  return fillable_ * table_->at(u).Se + soil_.specific_storage * std::max(u, 0.0);
}

double FlowSystem::outflow(const OuterFace& f) const {
  const CurvePoint& p = point_[static_cast<std::size_t>(f.cell)];
  switch (conditions_[static_cast<std::size_t>(f.patch)].kind) {
    case Boundary::closed:
      return 0.0;
    case Boundary::flux:
      return -f.flux * f.area;
    case Boundary::free_drainage:
      return soil_.Ks * p.K * f.area * f.normal_down;
    case Boundary::head:
    case Boundary::seepage:
      break;
  }
  const double q = f.conductance * (p.Phi - f.Phi + p.K * f.rise_in + f.K * f.rise_out);
  return conditions_[static_cast<std::size_t>(f.patch)].kind == Boundary::seepage ? std::max(q, 0.0)
                                                                                  : q;
}

double FlowSystem::outflow_slope(const OuterFace& f) const {
  const CurvePoint& p = point_[static_cast<std::size_t>(f.cell)];
  switch (conditions_[static_cast<std::size_t>(f.patch)].kind) {
    case Boundary::closed:
    case Boundary::flux:
      return 0.0;
    case Boundary::free_drainage:
      return soil_.Ks * p.dK * f.area * f.normal_down;
    case Boundary::seepage:
      if (outflow(f) <= 0.0) return 0.0;
      break;
    case Boundary::head:
      break;
  }
  return f.conductance * (p.dPhi + p.dK * f.rise_in);
}

void FlowSystem::net_outflow(std::span<double> out) {
  std::fill(out.begin(), out.end(), 0.0);
  std::fill(patch_outflow_.begin(), patch_outflow_.end(), 0.0);
  for (const InnerFace& f : inner_) {
    const CurvePoint &a = point_[static_cast<std::size_t>(f.a)],
                     &b = point_[static_cast<std::size_t>(f.b)];
    const double q = f.conductance * (a.Phi - b.Phi + a.K * f.rise_a + b.K * f.rise_b);
    out[static_cast<std::size_t>(f.a)] += q;
    out[static_cast<std::size_t>(f.b)] -= q;
  }
  for (const OuterFace& f : outer_) {
    const double q = outflow(f);
    out[static_cast<std::size_t>(f.cell)] += q;
    patch_outflow_[static_cast<std::size_t>(f.patch)] += q;
  }
}

void FlowSystem::add_jacobian(std::span<double> values) const {
  for (const InnerFace& f : inner_) {
    const CurvePoint &a = point_[static_cast<std::size_t>(f.a)],
                     &b = point_[static_cast<std::size_t>(f.b)];
    const double da = f.conductance * (a.dPhi + a.dK * f.rise_a);
    const double db = f.conductance * (b.dPhi - b.dK * f.rise_b);
    values[static_cast<std::size_t>(f.aa)] += da;
    values[static_cast<std::size_t>(f.ba)] -= da;
    values[static_cast<std::size_t>(f.ab)] -= db;
    values[static_cast<std::size_t>(f.bb)] += db;
  }
  for (const OuterFace& f : outer_)
    values[static_cast<std::size_t>(f.diagonal)] += outflow_slope(f);
}

}  // namespace ringwright::solver
