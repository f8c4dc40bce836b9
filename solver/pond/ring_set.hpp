#pragma once
/// The one or two rings of a test and their ponds, led through their programs together.

#include <span>
#include <vector>

#include "solver/flow/flow_system.hpp"
#include "solver/flow/pond.hpp"
#include "solver/pond/ring_driver.hpp"
#include "solver/ring_patches.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::solver {

class RingSet {
 public:
  RingSet(const TestSetup& setup, const RingPatches& patches);
  RingSet(const RingSet&) = delete;  // the conditions it sets refer to it
  RingSet& operator=(const RingSet&) = delete;

  /// To be given to the flow system.
  const std::vector<Pond>& ponds() const { return ponds_; }
  std::size_t size() const { return rings_.size(); }

  /// Sets conditions and feeds, and the ponds' unknowns in u.
  void begin_leg(FlowSystem& flow, std::span<double> u, double t) const;
  /// A first step that does justice to the ramps the leg begins with [s]; 0: no ramp.
  double first_step() const;
  /// The earliest time, after t, at which something is to be done or expected [s].
  double next_stop(double t) const;
  /// After a step. @param totals of the leg @return true when a new leg must begin
  bool see(const FlowSystem& flow, double t, std::span<const double> u,
           std::span<const double> totals);
  /// Ends the leg.
  void turn(const FlowSystem& flow, double t, std::span<const double> u,
            std::span<const double> totals);
  /// Water of one ring at t within the leg.
  RingWater water(std::size_t ring, const FlowSystem& flow, double t, std::span<const double> u,
                  std::span<const double> totals) const;
  /// Heads of the ponds from their storage: within a step they are as exact as the totals then,
  /// while the unknowns themselves are only known at its ends.
  void take_levels(const FlowSystem& flow, std::span<const double> storage,
                   std::span<double> u) const;
  bool test_is_over() const;
  /// Of all rings, in the order of time.
  std::vector<Event> events() const;

 private:
  double pond_head(std::size_t ring, const FlowSystem& flow, std::span<const double> u) const;
  RingDriver::LegTotals leg(std::size_t ring, const FlowSystem& flow,
                            std::span<const double> totals) const;
  void add(const models::PondProgram& program, std::size_t patch, double area, double pond_head);

  std::vector<Pond> ponds_;
  std::vector<RingDriver> rings_;
  std::vector<int> patch_, pond_;  // of each ring; pond -1: none
};

}  // namespace ringwright::solver
