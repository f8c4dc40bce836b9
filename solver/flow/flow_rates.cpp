/// Evaluation of the flow equation: state, flows, Jacobian.

#include <cmath>

#include "solver/flow/flow_system.hpp"

namespace ringwright::solver {
namespace {

constexpr double kFilm = 1e-3;  // [m], of water that evaporates at the full rate

double clipped(double x) { return std::clamp(x, 0.0, 1.0); }
bool inside(double x) { return x > 0.0 && x < 1.0; }

}  // namespace

void FlowSystem::update(OuterFace& f, double t) {
  const Condition& c = condition(f);
  const CurveTable& table = this->table(f.cell);
  if (c.kind == Boundary::head) {
    const CurvePoint p = table.at(table.u_of_head(c.value(t, f.position)));
    f.Phi = p.Phi, f.K = p.K;
  } else if (c.kind == Boundary::seepage) {
    f.Phi = table.at(0.0).Phi, f.K = 1.0;
  } else if (c.kind == Boundary::flux) {
    f.flux = c.value(t, f.position);
  }
}

void FlowSystem::set_time(double t) {
  if (!varies_) return;
  for (OuterFace& f : outer_)
    if (condition(f).varies_in_time) update(f, t);
}

void FlowSystem::set_state(std::span<const double> u) {
  std::copy(u.begin(), u.end(), u_.begin());
  for (const Stretch& s : stretches_)
    for (std::size_t i = s.begin; i < s.end; ++i) point_[i] = s.table->at(u_[i]);
  for (std::size_t k = 0; k < ponds_.size(); ++k) set_pond_state(k);
  set_mixed_faces();
}

bool FlowSystem::is_active(std::size_t pond) const {
  return conditions_[static_cast<std::size_t>(ponds_[pond].patch)].kind == Boundary::pond;
}

// The pond's depth as its storage; its head as that of the faces under it.
void FlowSystem::set_pond_state(std::size_t k) {
  const Pond& pond = ponds_[k];
  const auto unknown = static_cast<std::size_t>(cells_) + k;
  if (!is_active(k)) {
    point_[unknown] = {};
    return;
  }
  const double head = u_[unknown], depth = head - pond.base_head;
  point_[unknown].Se = std::max(depth, 0.0) / pond.scale;
  point_[unknown].dSe = depth > 0.0 ? 1.0 / pond.scale : 0.0;
  for (OuterFace& f : outer_) {
    if (f.patch != pond.patch) continue;
    const CurvePoint p = table(f.cell).at_head(head);
    f.Phi = p.Phi, f.K = p.K, f.dPhi = p.dPhi, f.dK = p.dK;
  }
}

void FlowSystem::set_mixed_faces() {
  for (MixedFace& f : mixed_)
    f.flow = material_flow(f.half_a, f.half_b, point(f.a), point(f.b), f.head);
}

double FlowSystem::storage_of_u(int cell, double u) const {
  return fillable(cell) * table(cell).at(u).Se +
         specific_storage_[static_cast<std::size_t>(cell)] * std::max(u, 0.0);
}

double FlowSystem::head_of_u(int i, double u) const {
  return i < cells_ ? table(i).head_of_u(u) : u;
}

double FlowSystem::u_of_head(int i, double h) const {
  return i < cells_ ? table(i).u_of_head(h) : h;
}

double FlowSystem::outflow(const OuterFace& f) const {
  const CurvePoint& p = point(f.cell);
  const models::Soil& soil = material(f.cell).soil;
  switch (condition(f).kind) {
    case Boundary::closed:
      return 0.0;
    case Boundary::flux:
      return -f.flux * f.area;
    case Boundary::free_drainage:
      return soil.Ks * p.K * f.area * f.normal_down;
    case Boundary::head:
    case Boundary::pond:
    case Boundary::seepage:
      break;
  }
  const double q = f.conductance * (p.Phi - f.Phi + p.K * f.rise_in + f.K * f.rise_out);
  return condition(f).kind == Boundary::seepage ? std::max(q, 0.0) : q;
}

double FlowSystem::outflow_slope(const OuterFace& f) const {
  const CurvePoint& p = point(f.cell);
  switch (condition(f).kind) {
    case Boundary::closed:
    case Boundary::flux:
      return 0.0;
    case Boundary::free_drainage:
      return material(f.cell).soil.Ks * p.dK * f.area * f.normal_down;
    case Boundary::seepage:
      if (outflow(f) <= 0.0) return 0.0;
      break;
    case Boundary::head:
    case Boundary::pond:
      break;
  }
  return f.conductance * (p.dPhi + p.dK * f.rise_in);
}

double FlowSystem::farthest_outflow(int patch) const {
  double farthest = 0.0;
  for (const OuterFace& f : outer_)
    if (f.patch == patch && outflow(f) > 0.0) farthest = std::max(farthest, f.position);
  return farthest;
}

void FlowSystem::net_outflow(std::span<double> out) {
  std::fill(out.begin(), out.end(), 0.0);
  std::fill(totals_.begin(), totals_.end(), 0.0);
  for (const InnerFace& f : inner_) {
    const CurvePoint &a = point(f.a), &b = point(f.b);
    const double q = f.conductance * (pushed(a, f.rise_a) - pushed(b, -f.rise_b));
    out[static_cast<std::size_t>(f.a)] += q;
    out[static_cast<std::size_t>(f.b)] -= q;
  }
  for (const MixedFace& f : mixed_) {
    out[static_cast<std::size_t>(f.a)] += f.flow.q;
    out[static_cast<std::size_t>(f.b)] -= f.flow.q;
  }
  for (const OuterFace& f : outer_) {
    const double q = outflow(f);
    out[static_cast<std::size_t>(f.cell)] += q;
    totals_[static_cast<std::size_t>(f.patch)] += q;
  }
  add_pond_flows(out);
}

void FlowSystem::add_pond_flows(std::span<double> out) {
  for (std::size_t k = 0; k < ponds_.size(); ++k) {
    if (!is_active(k)) continue;
    const auto unknown = static_cast<std::size_t>(cells_) + k;
    const Pond& pond = ponds_[k];
    const PondFeed& feed = feeds_[k];
    const double head = u_[unknown];
    const double supply = feed.largest_rate * clipped((feed.set_head - head) / feed_band);
    const double evaporation = feed.evaporation * clipped((head - pond.base_head) / kFilm);
    totals_[static_cast<std::size_t>(supply_total(static_cast<int>(k)))] = supply;
    totals_[static_cast<std::size_t>(evaporation_total(static_cast<int>(k)))] = evaporation;
    // what enters the soil left the pond
    out[unknown] = evaporation - supply - totals_[static_cast<std::size_t>(pond.patch)];
  }
}

void FlowSystem::add_jacobian(std::span<double> values) const {
  const auto at = [&](int position) -> double& {
    return values[static_cast<std::size_t>(position)];
  };
  const auto add = [&](const auto& f, double da, double db) {
    at(f.aa) += da;
    at(f.ab) += db;
    at(f.ba) -= da;
    at(f.bb) -= db;
  };
  for (const InnerFace& f : inner_)
    add(f, f.conductance * pushed_slope(point(f.a), f.rise_a),
        -f.conductance * pushed_slope(point(f.b), -f.rise_b));
  for (const MixedFace& f : mixed_) add(f, f.flow.slope_a, f.flow.slope_b);
  for (const OuterFace& f : outer_) at(f.diagonal) += outflow_slope(f);
  add_pond_jacobian(values);
}

void FlowSystem::add_pond_jacobian(std::span<double> values) const {
  for (std::size_t k = 0; k < ponds_.size(); ++k) {
    const auto unknown = static_cast<std::size_t>(cells_) + k;
    double& own = values[static_cast<std::size_t>(pattern_.diagonal[unknown])];
    if (!is_active(k)) {
      own = 1.0;  // rests: its equation is that it does not move
      continue;
    }
    const Pond& pond = ponds_[k];
    const PondFeed& feed = feeds_[k];
    const double head = u_[unknown];
    if (inside((feed.set_head - head) / feed_band)) own += feed.largest_rate / feed_band;
    if (inside((head - pond.base_head) / kFilm)) own += feed.evaporation / kFilm;
    for (const OuterFace& f : outer_) {
      if (f.patch != pond.patch) continue;
      const double by_head = f.conductance * (-f.dPhi + f.dK * f.rise_out);
      values[static_cast<std::size_t>(f.cell_pond)] += by_head;
      values[static_cast<std::size_t>(f.pond_cell)] -= outflow_slope(f);
      own -= by_head;
    }
  }
}

}  // namespace ringwright::solver
