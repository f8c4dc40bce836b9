#pragma once
/// One virtual ring test at one resolution: soil, ring and head in, volumes and flows out.

#include <atomic>
#include <functional>
#include <memory>
#include <optional>
#include <vector>

#include "models/ground/layer.hpp"
#include "models/protocol/pond_program.hpp"
#include "models/ring/single_ring.hpp"
#include "models/soil/curves.hpp"
#include "solver/mesh/cells_and_faces.hpp"

namespace ringwright::solver {

class CurveTable;
struct Material;

/// The physical question. The first fields make the simplest test, a single ring at a constant head
/// on uniform ground; what follows `more` is left empty for it.
struct TestSetup {
  models::Soil soil;          ///< from the surface down
  double initial_head = 0.0;  ///< pressure head before the test [m], < 0
  models::SingleRing ring;    ///< of a double ring the inner one
  double pond_head = 0.0;     ///< head in the ring from t = 0 [m], >= 0, where it has no program
  double duration = 0.0;      ///< [s]
  std::vector<double> times;  ///< where samples are wanted [s], ascending, within (0, duration]
  std::vector<double> snapshots;  ///< where fields are wanted [s], ascending; may be empty

  // more rings and what is done in them
  std::optional<models::SingleRing> outer_ring = std::nullopt;
  models::PondProgram program = {};        ///< of the ring; no stages: `pond_head` held
  models::PondProgram outer_program = {};  ///< of the outer ring; no stages: `pond_head` held

  // more ground
  std::vector<models::Layer> layers_below = {};      ///< ascending; their tops below the surface
  std::optional<double> water_table = std::nullopt;  ///< depth [m]; the ground is hydrostatic
                                                     ///< to it and stays so far outside
  std::optional<models::DisturbedSoil> disturbed = std::nullopt;
  std::optional<models::WallGap> gap = std::nullopt;
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

/// The water of one ring at one time; volumes since the start.
///   supply = soil + standing + evaporated + removed
struct RingWater {
  double head = 0.0;        ///< at the soil surface [m]; below 0: no water stands
  double soil = 0.0;        ///< into the ground [m3]
  double soil_flow = 0.0;   ///< [m3/s]
  double standing = 0.0;    ///< in ring and vessel [m3]
  double supply = 0.0;      ///< given by the tank [m3]
  double evaporated = 0.0;  ///< [m3]
  double removed = 0.0;     ///< bailed, bled or spilt [m3]
};

/// State of the totals at one time; volumes since the start, all for the full circle.
struct Sample {
  double time = 0.0;         ///< [s]
  double ring_volume = 0.0;  ///< into the soil through the (inner) ring's surface [m3]
  double ring_flow = 0.0;    ///< [m3/s]
  double drainage_volume =
      0.0;  ///< out of the bottom, drainage of the initial profile included [m3]
  double seepage_volume = 0.0;  ///< out of the surface outside the rings [m3]
  double stored_volume = 0.0;   ///< change of the water stored in the soil [m3]
  Wetted wetted;                ///< ground wetted so far
  double side_volume = 0.0;     ///< out of the side, towards a water table far outside [m3]
  RingWater water = {};         ///< of the (inner) ring
  RingWater outer_water = {};   ///< of the annulus of a double ring
};

enum class EventKind {
  head_reached,       ///< a limited supply has brought the water to the head set
  head_lost,          ///< the soil drinks more than the supply gives: the head begins to sag
  emptied,            ///< no water stands in the ring any more
  refilled,           ///< filled up again at the threshold of a falling head
  reservoir_empty,    ///< value: volume it gave [m3]
  reservoir_brought,  ///< the next full reservoir is there
  surfaced,           ///< water wells up outside; value: radius [m]
  test_ended          ///< before its time, since the reservoir is empty
};

struct Event {
  double time = 0.0;  ///< [s]
  EventKind kind = EventKind::emptied;
  bool outer = false;  ///< in the outer ring
  double value = 0.0;
};

/// Water welling up at the surface outside the rings.
struct Surfacing {
  bool happened = false;
  double first_time = 0.0;  ///< [s]
  double farthest = 0.0;    ///< largest radius at which water came out [m]
  double volume = 0.0;      ///< [m3]
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
  bool domain_reached = false;  ///< water came to the edge of the largest domain tried
  double balance_error = 0.0;   ///< |storage + out - in| over throughput [-]
  double domain_radius = 0.0, domain_depth = 0.0;  ///< [m]
};

struct TestRun {
  std::vector<Sample> samples;  ///< one per wanted time (fewer if interrupted)
  std::vector<Snapshot> snapshots;
  std::vector<Event> events = {};  ///< in the order they came
  Surfacing surfacing = {};
  double ended = 0.0;  ///< time reached [s]; before the duration if the protocol says so
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
/// The same with a look-up table of the uppermost soil's curves made before.
TestRun run_test(const TestSetup& setup, const Resolution& resolution,
                 std::shared_ptr<const CurveTable> table, const StepObserver& observer = {});
/// The same with the materials of ground_materials(setup).
TestRun run_test(const TestSetup& setup, const Resolution& resolution,
                 const std::vector<Material>& materials, const StepObserver& observer = {});

}  // namespace ringwright::solver
