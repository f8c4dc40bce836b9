#pragma once
/// One run of a test on one domain: mesh, flow, rings and integrator put together.

#include <optional>
#include <vector>

#include "solver/domain.hpp"
#include "solver/flow/flow_system.hpp"
#include "solver/ground_materials.hpp"
#include "solver/mesh/cells_and_faces.hpp"
#include "solver/pond/ring_set.hpp"
#include "solver/ring_patches.hpp"
#include "solver/time/integrator.hpp"
#include "solver/virtual_test.hpp"
#include "solver/wetted.hpp"

namespace ringwright::solver {

class TestAttempt {
 public:
  /// @param setup must outlive the attempt
  TestAttempt(const TestSetup& setup, const Resolution& resolution, const Domain& domain,
              const std::vector<Material>& materials);

  /// To be called once. @throws SolverFailure
  TestRun run(const StepObserver& observer);
  /// Afterwards.
  bool domain_was_large_enough() const;

 private:
  double step(double stop);
  void begin_leg(double t);
  void end_leg(double t);
  void sample(double t);
  void snapshot(double t);
  void watch_surface(double t);
  double pond_defect();
  void finish();
  double stored() const;

  std::optional<double> ponds_defect_at_turn_;  // of the turn that ended the test [m3]
  const TestSetup& setup_;
  CellsAndFaces mesh_;
  RingPatches patches_;
  RingSet rings_;
  FlowSystem flow_;
  Integrator integrator_;
  std::vector<double> u_, storage_;
  WettedGround ground_;
  std::vector<double> before_leg_;      // totals up to the start of the leg
  std::vector<double> totals_, rates_;  // of the leg
  double stored_at_start_ = 0.0;
  double through_before_leg_ = 0.0;  // sum of |totals| of the legs before
  TestRun run_;
};

}  // namespace ringwright::solver
