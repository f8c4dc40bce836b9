#include "solver/pond/ring_set.hpp"

#include <algorithm>
#include <numbers>

namespace ringwright::solver {
namespace {

double disc(double radius) { return std::numbers::pi * radius * radius; }

}  // namespace

RingSet::RingSet(const TestSetup& setup, const RingPatches& patches) {
  rings_.reserve(2);  // they must stay where they are
  const double inner = disc(setup.ring.radius);
  add(setup.program, patches.ring, inner, setup.pond_head);
  if (patches.annulus)
    add(setup.outer_program, *patches.annulus, disc(setup.outer_ring->radius) - inner,
        setup.pond_head);
}

void RingSet::add(const models::PondProgram& program, std::size_t patch, double area,
                  double pond_head) {
  const models::Vessel vessel = program.vessel.value_or(models::Vessel{area});
  int pond = -1;
  if (RingDriver::needs_pond(program)) {
    pond = static_cast<int>(ponds_.size());
    ponds_.push_back({static_cast<int>(patch), vessel.area, vessel.base_head});
  }
  const bool outer = !rings_.empty();
  patch_.push_back(static_cast<int>(patch));
  pond_.push_back(pond);
  rings_.emplace_back(program, vessel, pond_head,
                      RingDriver::Place{static_cast<int>(patch), pond, outer});
}

double RingSet::pond_head(std::size_t ring, const FlowSystem& flow,
                          std::span<const double> u) const {
  return pond_[ring] < 0 ? 0.0 : u[static_cast<std::size_t>(flow.pond_unknown(pond_[ring]))];
}

RingDriver::LegTotals RingSet::leg(std::size_t ring, const FlowSystem& flow,
                                   std::span<const double> totals) const {
  const auto at = [&](int index) { return totals[static_cast<std::size_t>(index)]; };
  RingDriver::LegTotals leg;
  leg.soil = -at(patch_[ring]);
  if (pond_[ring] < 0) return leg;
  leg.supply = at(flow.supply_total(pond_[ring]));
  leg.evaporated = at(flow.evaporation_total(pond_[ring]));
  return leg;
}

void RingSet::begin_leg(FlowSystem& flow, std::span<double> u, double t) const {
  for (std::size_t k = 0; k < rings_.size(); ++k) {
    rings_[k].begin_leg(flow, t);
    if (pond_[k] >= 0)
      u[static_cast<std::size_t>(flow.pond_unknown(pond_[k]))] =
          rings_[k].is_standing() ? rings_[k].head() : 0.0;
  }
}

double RingSet::first_step() const {
  double shortest = 0.0;
  for (const RingDriver& ring : rings_)
    if (const double step = ring.first_step(); step > 0.0)
      shortest = shortest > 0.0 ? std::min(shortest, step) : step;
  return shortest;
}

double RingSet::next_stop(double t) const {
  double next = std::numeric_limits<double>::infinity();
  for (const RingDriver& ring : rings_)
    next = std::min({next, ring.next_change(t), ring.expected_event()});
  return next;
}

bool RingSet::see(const FlowSystem& flow, double t, std::span<const double> u,
                  std::span<const double> totals) {
  bool due = false;
  for (std::size_t k = 0; k < rings_.size(); ++k)
    due = rings_[k].see(t, pond_head(k, flow, u), leg(k, flow, totals)) || due;
  return due;
}

void RingSet::turn(const FlowSystem& flow, double t, std::span<const double> u,
                   std::span<const double> totals) {
  for (std::size_t k = 0; k < rings_.size(); ++k)
    rings_[k].turn(t, pond_head(k, flow, u), leg(k, flow, totals));
}

RingWater RingSet::water(std::size_t ring, const FlowSystem& flow, double t,
                         std::span<const double> u, std::span<const double> totals) const {
  return rings_[ring].water(t, pond_head(ring, flow, u), leg(ring, flow, totals));
}

void RingSet::take_levels(const FlowSystem& flow, std::span<const double> storage,
                          std::span<double> u) const {
  for (std::size_t k = 0; k < ponds_.size(); ++k) {
    const auto unknown = static_cast<std::size_t>(flow.pond_unknown(static_cast<int>(k)));
    if (storage[unknown] > 0.0)
      u[unknown] = ponds_[k].base_head + storage[unknown] * ponds_[k].scale;
  }
}

bool RingSet::test_is_over() const {
  return std::any_of(rings_.begin(), rings_.end(),
                     [](const RingDriver& ring) { return ring.test_is_over(); });
}

std::vector<Event> RingSet::events() const {
  std::vector<Event> all;
  for (const RingDriver& ring : rings_)
    all.insert(all.end(), ring.events().begin(), ring.events().end());
  std::stable_sort(all.begin(), all.end(),
                   [](const Event& a, const Event& b) { return a.time < b.time; });
  return all;
}

}  // namespace ringwright::solver
