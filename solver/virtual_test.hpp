#pragma once
/// One virtual ring test at one resolution: soil, ring and head in, volumes and flows out.

#include <atomic>
#include <functional>
#include <memory>
#include <vector>

#include "models/ring/single_ring.hpp"
#include "models/soil/curves.hpp"
#include "solver/mesh/cells_and_faces.hpp"

namespace ringwright::solver {

class CurveTable;

/// The physical question.
struct TestSetup {
  models::Soil soil;
  double initial_head = 0.0;  ///< uniform pressure head before the test [m], < 0
  models::SingleRing ring;
  double pond_head = 0.0;         ///< constant head in the ring from t = 0 [m], >= 0
  double duration = 0.0;          ///< [s]
  std::vector<double> times;      ///< where samples are wanted [s], ascending, within (0, duration]
  std::vector<double> snapshots;  ///< where fields are wanted [s], ascending; may be empty
};

/// How finely it is answered. Made by resolution_for() (solver/resolution.hpp); a case file has no
/// key for it.
struct Resolution {
  double tip_cell =
      0.0;  ///< edge of the square cells at the foot of the wall, before splitting [m]
  double top_cell = 0.0;     ///< height of the uppermost cells, before splitting [m]
  double growth = 1.6;       ///< largest ratio of neighbouring cells outwards, before splitting [-]
  double growth_down = 1.4;  ///< the same downwards below the foot of the wall
  double growth_inside = 1.35;    ///< the same between surface and foot, where the front starts
  int splits = 1;                 ///< every cell is split in 2 x 2 this many times
  double theta_tolerance = 1e-3;  ///< absolute error of water content per time step [-]

  /// The same mesh with cells twice as wide and high.
  Resolution coarser() const;
  /// Cells `share` times as wide and high; growth follows, so that the coarser mesh of the
  /// result stays its image.
  Resolution scaled(double share) const;
};

/// Extent of the ground wetted by the test: where theta rose by more than 5 % of (theta_s -
/// theta_initial).
struct Wetted {
  double depth = 0.0;        ///< below the soil surface [m]
  double beyond_wall = 0.0;  ///< horizontally outside the wall [m]
};

/// State of the totals at one time; volumes since the start, all for the full circle.
struct Sample {
  double time = 0.0;         ///< [s]
  double ring_volume = 0.0;  ///< into the soil through the ring's surface [m3]
  double ring_flow = 0.0;    ///< [m3/s]
  double drainage_volume =
      0.0;  ///< out of the bottom, drainage of the initial profile included [m3]
  double seepage_volume = 0.0;  ///< out of the surface outside the ring [m3]
  double stored_volume = 0.0;   ///< change of the water stored in the soil [m3]
  Wetted wetted;                ///< ground wetted so far
};

struct Snapshot {
  double time = 0.0;                  ///< [s]
  std::vector<double> head;           ///< pressure head per cell [m]
  std::vector<double> water_content;  ///< per cell [-]
};

struct RunStatistics {
  int cells = 0;
  long steps = 0, newton_iterations = 0, factorisations = 0, convergence_failures = 0;
  int domain_enlargements = 0;
  double balance_error = 0.0;                      ///< |storage + out - in| over throughput [-]
  double domain_radius = 0.0, domain_depth = 0.0;  ///< [m]
};

struct TestRun {
  std::vector<Sample> samples;  ///< one per wanted time (fewer if interrupted)
  std::vector<Snapshot> snapshots;
  Drawing drawing;
  RunStatistics statistics;
  bool interrupted = false;
};

/// Called after each accepted step with the time reached [s]; returning false stops the run.
using StepObserver = std::function<bool(double)>;

/// Runs the test.
/// @throws SolverFailure when the integration cannot go on (time, cause, worst cells)
/// @throws std::invalid_argument when the soil is saturated before the test
TestRun run_test(const TestSetup& setup, const Resolution& resolution,
                 const StepObserver& observer = {});
/// The same with a look-up table of the soil's curves made before.
TestRun run_test(const TestSetup& setup, const Resolution& resolution,
                 std::shared_ptr<const CurveTable> table, const StepObserver& observer = {});

}  // namespace ringwright::solver
