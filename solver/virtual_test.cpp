#include "solver/virtual_test.hpp"

#include <algorithm>
#include <cmath>
#include <stdexcept>

#include "solver/domain.hpp"
#include "solver/failure.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/flow/flow_system.hpp"
#include "solver/mesh/ring_mesh.hpp"
#include "solver/ring_patches.hpp"
#include "solver/time/integrator.hpp"

namespace ringwright::solver {
namespace {

constexpr double kMovedAtEdge = 1e-3;  // of dtheta, at the outer faces of the domain
constexpr double kFartherIn = 1.5;
constexpr int kMostEnlargements = 4;
constexpr double kWettedShare = 0.05;  // of dtheta, defines the wetted body

// One attempt on one domain.
class Attempt {
 public:
  Attempt(const TestSetup& setup, const Resolution& resolution, const Domain& domain,
          std::shared_ptr<const CurveTable> table)
      : setup_(setup),
        mesh_(ring_mesh(setup.ring, domain, resolution)),
        flow_(mesh_, setup.soil, std::move(table), ring_conditions(mesh_, setup.pond_head)),
        patches_(ring_patches(mesh_)),
        integrator_(flow_, resolution.theta_tolerance),
        u_(static_cast<std::size_t>(flow_.cells()), flow_.table().u_of_head(setup.initial_head)),
        storage_(u_.size()) {
    run_.statistics.cells = flow_.cells();
    run_.statistics.domain_radius = domain.radius;
    run_.statistics.domain_depth = domain.depth;
    stored_at_start_ = stored();
  }

  TestRun run(const StepObserver& observer);
  bool domain_was_large_enough() const;

 private:
  std::size_t columns() const;
  Wetted wetted() const;
  double stored() {
    flow_.set_state(u_);
    double sum = 0.0;
    for (int i = 0; i < flow_.cells(); ++i)
      sum += flow_.volume()[static_cast<std::size_t>(i)] * flow_.storage(i);
    return sum;
  }
  double content(double u) const { return flow_.storage_of_u(u); }
  double step(double stop);
  void sample(double t);
  void snapshot(double t);
  void finish();

  const TestSetup& setup_;
  CellsAndFaces mesh_;
  FlowSystem flow_;
  RingPatches patches_;
  Integrator integrator_;
  std::vector<double> u_, storage_;
  double stored_at_start_ = 0.0;
  TestRun run_;
};

void Attempt::sample(double t) {
  std::vector<double> volume(mesh_.patches.size()), flow(mesh_.patches.size());
  integrator_.totals_at(t, volume, flow);
  Sample s;
  s.time = t;
  s.ring_volume = -volume[patches_.ring];
  s.ring_flow = -flow[patches_.ring];
  s.drainage_volume = volume[patches_.bottom];
  s.seepage_volume = volume[patches_.outside];
  integrator_.storage_at(t, storage_);
  s.stored_volume = integrator_.stored_at(t) - stored_at_start_;
  s.wetted = wetted();
  run_.samples.push_back(s);
}

void Attempt::snapshot(double t) {
  integrator_.u_at(t, u_);
  Snapshot s;
  s.time = t;
  for (double u : u_) {
    s.head.push_back(flow_.table().head_of_u(u));
    s.water_content.push_back(setup_.soil.theta_r + content(u));
  }
  run_.snapshots.push_back(std::move(s));
}

// The integrator knows no coordinates: a failure gets them here.
double Attempt::step(double stop) {
  try {
    return integrator_.step(stop);
  } catch (SolverFailure& failure) {
    for (WorstCell& c : failure.worst)
      c.centre = mesh_.drawing.centres[static_cast<std::size_t>(c.cell)];
    throw;
  }
}

TestRun Attempt::run(const StepObserver& observer) {
  integrator_.start(0.0, u_);
  auto next_sample = setup_.times.begin();
  auto next_snapshot = setup_.snapshots.begin();
  const double end =
      setup_.times.empty() ? setup_.duration : std::max(setup_.times.back(), setup_.duration);
  while (integrator_.time() < end) {
    const double t = step(end);
    for (; next_sample != setup_.times.end() && *next_sample <= t; ++next_sample)
      sample(*next_sample);
    for (; next_snapshot != setup_.snapshots.end() && *next_snapshot <= t; ++next_snapshot)
      snapshot(*next_snapshot);
    if (observer && !observer(t)) {
      run_.interrupted = t < end;
      break;
    }
  }
  finish();
  return std::move(run_);
}

void Attempt::finish() {
  const auto u = integrator_.u();
  std::copy(u.begin(), u.end(), u_.begin());
  std::vector<double> volume(mesh_.patches.size()), flow(mesh_.patches.size());
  integrator_.totals_at(integrator_.time(), volume, flow);
  double out = 0.0, throughput = 0.0;
  for (double v : volume) out += v, throughput += std::abs(v);
  RunStatistics& s = run_.statistics;
  s.balance_error =
      throughput > 0.0 ? std::abs(stored() - stored_at_start_ + out) / throughput : 0.0;
  const IntegratorStatistics i = integrator_.statistics();
  s.steps = i.steps, s.newton_iterations = i.newton_iterations;
  s.factorisations = i.factorisations, s.convergence_failures = i.convergence_failures;
  run_.drawing = mesh_.drawing;
}

// Where the wetted body ends along a line of cells, linear between centres.
Wetted Attempt::wetted() const {
  const double first = content(flow_.table().u_of_head(setup_.initial_head));
  const double limit = first + kWettedShare * (flow_.fillable() - first);
  const auto& centres = mesh_.drawing.centres;
  const std::size_t columns = this->columns();
  const auto end = [&](std::size_t inner, std::size_t outer, int axis) {
    const double a = storage_[inner], b = storage_[outer];
    const auto k = static_cast<std::size_t>(axis);
    return centres[inner][k] + (a - limit) / (a - b) * (centres[outer][k] - centres[inner][k]);
  };
  Wetted w;
  for (std::size_t c = 0; c < storage_.size(); ++c) {
    if (storage_[c] < limit) continue;
    const std::size_t below = c + columns, right = c + 1;
    if (below < storage_.size() && storage_[below] < limit)
      w.depth = std::max(w.depth, -end(c, below, 1));
    if (right % columns != 0 && storage_[right] < limit)
      w.beyond_wall = std::max(w.beyond_wall, end(c, right, 0) - setup_.ring.radius);
  }
  return w;
}

std::size_t Attempt::columns() const {
  const auto& centres = mesh_.drawing.centres;
  std::size_t n = 0;
  while (n < centres.size() && centres[n][1] == centres[0][1]) ++n;
  return n;
}

// The ground may drain everywhere, so what counts is not that theta moved at the edge but
// that it moved differently there: across the last columns and along the bottom.
bool Attempt::domain_was_large_enough() const {
  const auto u = integrator_.u();
  const std::size_t columns = this->columns();
  const std::size_t rows = u.size() / columns;
  const double first = content(flow_.table().u_of_head(setup_.initial_head));
  const double limit = kMovedAtEdge * (flow_.fillable() - first);
  // compared with a column a fair share farther in, however wide the outer cells are
  std::size_t back = 1;
  const auto radius = [&](std::size_t column) { return mesh_.drawing.centres[column][0]; };
  while (back + 1 < columns && radius(columns - 1 - back) > radius(columns - 1) / kFartherIn)
    ++back;
  for (std::size_t j = 0; j < rows; ++j) {
    const std::size_t last = j * columns + columns - 1;
    if (std::abs(content(u[last]) - content(u[last - back])) > limit) return false;
  }
  const std::size_t bottom = (rows - 1) * columns;
  return std::abs(content(u[bottom]) - content(u[bottom + columns - 1])) <= limit;
}

}  // namespace

Resolution Resolution::coarser() const {
  if (splits > 0) {
    Resolution r = *this;
    --r.splits;
    return r;
  }
  return scaled(2.0);
}

Resolution Resolution::scaled(double share) const {
  Resolution r = *this;
  r.tip_cell *= share;
  r.top_cell *= share;
  r.growth = std::pow(growth, share);
  r.growth_down = std::pow(growth_down, share);
  r.growth_inside = std::pow(growth_inside, share);
  return r;
}

TestRun run_test(const TestSetup& setup, const Resolution& resolution,
                 std::shared_ptr<const CurveTable> table, const StepObserver& observer) {
  if (setup.initial_head >= table->entry())
    throw std::invalid_argument("the soil is saturated before the test: there is nothing to fill");
  Domain domain = transient_domain(setup, table->capillary_length());
  for (int enlargements = 0;; ++enlargements) {
    Attempt attempt(setup, resolution, domain, table);
    TestRun run = attempt.run(observer);
    run.statistics.domain_enlargements = enlargements;
    if (run.interrupted || enlargements == kMostEnlargements || attempt.domain_was_large_enough())
      return run;
    domain.radius *= 1.5;
    domain.depth *= 1.5;
  }
}

TestRun run_test(const TestSetup& setup, const Resolution& resolution,
                 const StepObserver& observer) {
  return run_test(setup, resolution, std::make_shared<CurveTable>(setup.soil.curves), observer);
}

}  // namespace ringwright::solver
