#include "solver/test_attempt.hpp"

#include <algorithm>
#include <cmath>

#include "solver/failure.hpp"
#include "solver/mesh/ring_mesh.hpp"

namespace ringwright::solver {
namespace {

std::vector<double> unknowns_before(const TestSetup& setup, const CellsAndFaces& mesh,
                                    const FlowSystem& flow) {
  std::vector<double> u(static_cast<std::size_t>(flow.unknowns()));
  for (int i = 0; i < flow.cells(); ++i) {
    const auto k = static_cast<std::size_t>(i);
    u[k] = flow.u_of_head(i, head_before(setup, mesh.soil[k], mesh.elevation[k]));
  }
  return u;
}

std::vector<double> storage_of(const FlowSystem& flow, const std::vector<double>& u) {
  std::vector<double> W(u.size());
  for (int i = 0; i < flow.cells(); ++i)
    W[static_cast<std::size_t>(i)] = flow.storage_of_u(i, u[static_cast<std::size_t>(i)]);
  W.resize(static_cast<std::size_t>(flow.cells()));
  return W;
}

double outermost_radius(const TestSetup& setup) {
  return setup.outer_ring ? setup.outer_ring->radius : setup.ring.radius;
}

}  // namespace

TestAttempt::TestAttempt(const TestSetup& setup, const Resolution& resolution, const Domain& domain,
                         const std::vector<Material>& materials)
    : setup_(setup),
      mesh_(ring_mesh(setup, domain, resolution)),
      patches_(ring_patches(mesh_)),
      rings_(setup, patches_),
      flow_(mesh_, materials, ground_conditions(mesh_, setup), rings_.ponds()),
      integrator_(flow_, resolution.theta_tolerance),
      u_(unknowns_before(setup, mesh_, flow_)),
      storage_(u_.size()),
      ground_(flow_, mesh_.drawing, storage_of(flow_, u_), outermost_radius(setup)),
      before_leg_(flow_.totals().size()),
      totals_(before_leg_.size()),
      rates_(before_leg_.size()) {
  run_.statistics.cells = flow_.cells();
  run_.statistics.domain_radius = domain.radius;
  run_.statistics.domain_depth = domain.depth;
  stored_at_start_ = stored();
}

double TestAttempt::stored() const {
  double sum = 0.0;
  for (int i = 0; i < flow_.cells(); ++i) {
    const auto k = static_cast<std::size_t>(i);
    sum += flow_.volume()[k] * flow_.storage_of_u(i, u_[k]);
  }
  return sum;
}

// The integrator knows no coordinates: a failure gets them here.
double TestAttempt::step(double stop) {
  try {
    return integrator_.step(stop);
  } catch (SolverFailure& failure) {
    std::erase_if(failure.worst, [&](const WorstCell& c) { return c.cell >= flow_.cells(); });
    for (WorstCell& c : failure.worst)
      c.centre = mesh_.drawing.centres[static_cast<std::size_t>(c.cell)];
    throw;
  }
}

void TestAttempt::begin_leg(double t) {
  rings_.begin_leg(flow_, u_, t);
  integrator_.start(t, u_, rings_.first_step());
}

void TestAttempt::end_leg(double t) {
  const auto u = integrator_.u();
  std::copy(u.begin(), u.end(), u_.begin());
  integrator_.totals_at(t, totals_, rates_);
  for (std::size_t k = 0; k < totals_.size(); ++k) {
    before_leg_[k] += totals_[k];
    if (k < mesh_.patches.size()) through_before_leg_ += std::abs(totals_[k]);
  }
}

TestRun TestAttempt::run(const StepObserver& observer) {
  auto next_sample = setup_.times.begin();
  auto next_snapshot = setup_.snapshots.begin();
  const double end =
      setup_.times.empty() ? setup_.duration : std::max(setup_.times.back(), setup_.duration);
  begin_leg(0.0);
  bool over = false;
  while (integrator_.time() < end && !over) {
    const double t = step(std::min(end, rings_.next_stop(integrator_.time())));
    for (; next_sample != setup_.times.end() && *next_sample <= t; ++next_sample)
      sample(*next_sample);
    for (; next_snapshot != setup_.snapshots.end() && *next_snapshot <= t; ++next_snapshot)
      snapshot(*next_snapshot);
    watch_surface(t);
    if (observer && !observer(t)) {
      run_.interrupted = t < end;
      break;
    }
    integrator_.totals_at(t, totals_, rates_);
    if (!rings_.see(flow_, t, integrator_.u(), totals_)) continue;
    // A ring that has turned is in its next leg, which a test that is over does not begin.
    const double ponds_defect = pond_defect();
    rings_.turn(flow_, t, integrator_.u(), totals_);
    over = rings_.test_is_over();
    if (over) ponds_defect_at_turn_ = ponds_defect;
    if (over) break;
    if (t < end) {
      end_leg(t);
      begin_leg(t);
    }
  }
  finish();
  return std::move(run_);
}

void TestAttempt::sample(double t) {
  integrator_.totals_at(t, totals_, rates_);
  std::vector<double> u(u_.size());
  integrator_.u_at(t, u);
  integrator_.storage_at(t, storage_);
  rings_.take_levels(flow_, storage_, u);
  Sample s;
  s.time = t;
  s.ring_volume = -(before_leg_[patches_.ring] + totals_[patches_.ring]);
  s.ring_flow = -rates_[patches_.ring];
  s.drainage_volume = before_leg_[patches_.bottom] + totals_[patches_.bottom];
  s.side_volume = before_leg_[patches_.side] + totals_[patches_.side];
  s.seepage_volume = before_leg_[patches_.outside] + totals_[patches_.outside];
  s.stored_volume = integrator_.stored_at(t) - stored_at_start_;
  s.wetted = ground_.extent(storage_);
  s.water = rings_.water(0, flow_, t, u, totals_);
  s.water.soil_flow = s.ring_flow;
  if (patches_.annulus) {
    s.outer_water = rings_.water(1, flow_, t, u, totals_);
    s.outer_water.soil_flow = -rates_[*patches_.annulus];
  }
  run_.samples.push_back(s);
}

void TestAttempt::snapshot(double t) {
  std::vector<double> u(u_.size());
  integrator_.u_at(t, u);
  Snapshot s;
  s.time = t;
  for (int i = 0; i < flow_.cells(); ++i) {
    const auto k = static_cast<std::size_t>(i);
    s.head.push_back(flow_.head_of_u(i, u[k]));
    s.water_content.push_back(flow_.material(i).soil.theta_r + flow_.storage_of_u(i, u[k]));
  }
  run_.snapshots.push_back(std::move(s));
}

void TestAttempt::watch_surface(double t) {
  const double reach = flow_.farthest_outflow(static_cast<int>(patches_.outside));
  if (!(reach > 0.0)) return;
  if (!run_.surfacing.happened) {
    run_.surfacing.first_time = t;
    run_.events.push_back({t, EventKind::surfaced, false, reach});
  }
  run_.surfacing.happened = true;
  run_.surfacing.farthest = std::max(run_.surfacing.farthest, reach);
}

// What the ponds' own balances miss [m3].
double TestAttempt::pond_defect() {
  integrator_.totals_at(integrator_.time(), totals_, rates_);
  double sum = 0.0;
  for (std::size_t k = 0; k < rings_.size(); ++k) {
    const RingWater w = rings_.water(k, flow_, integrator_.time(), integrator_.u(), totals_);
    sum += std::abs(w.supply - w.soil - w.standing - w.evaporated - w.removed);
  }
  return sum;
}

void TestAttempt::finish() {
  const double t = integrator_.time();
  run_.ended = t;
  const double ponds_defect = ponds_defect_at_turn_ ? *ponds_defect_at_turn_ : pond_defect();
  end_leg(t);
  double out = 0.0;
  for (std::size_t k = 0; k < mesh_.patches.size(); ++k) out += before_leg_[k];
  RunStatistics& s = run_.statistics;
  const double defect = std::abs(stored() - stored_at_start_ + out) + ponds_defect;
  s.balance_error = through_before_leg_ > 0.0 ? defect / through_before_leg_ : 0.0;
  run_.surfacing.volume = before_leg_[patches_.outside];
  const std::vector<Event> events = rings_.events();
  run_.events.insert(run_.events.end(), events.begin(), events.end());
  std::stable_sort(run_.events.begin(), run_.events.end(),
                   [](const Event& a, const Event& b) { return a.time < b.time; });
  const IntegratorStatistics i = integrator_.statistics();
  s.steps = i.steps, s.newton_iterations = i.newton_iterations;
  s.factorisations = i.factorisations, s.convergence_failures = i.convergence_failures;
  run_.drawing = mesh_.drawing;
}

// Over a water table the domain is that of the steady flow, which needs no more: there the water
// spreads in saturated ground, whose edge is meant to be reached.
bool TestAttempt::domain_was_large_enough() const {
  return setup_.water_table || !ground_.reached_the_edge(storage_of(flow_, u_));
}

}  // namespace ringwright::solver
