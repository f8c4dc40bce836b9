#pragma once
/// One test of the section `tests:` once read.

#include <optional>
#include <string>
#include <vector>

#include "models/protocol/constant_head.hpp"
#include "models/protocol/pond_program.hpp"
#include "models/protocol/stop_rule.hpp"
#include "models/ring/lid.hpp"
#include "models/ring/single_ring.hpp"

namespace ringwright::cases {

/// Where the level that belongs to the head moves.
enum class VesselKind {
  ring,       ///< in the ring itself
  standpipe,  ///< in a pipe on the lid, above a ring that stays full
  tank,       ///< in the ring and in a tank joined to it
  air         ///< nowhere: the water is pressed by air
};

/// What is done with the water of one ring.
struct RingProgram {
  std::vector<models::Stage> stages;  ///< empty: one constant head from time 0, supply unlimited
  models::Supply supply;
  std::vector<models::EmptySpell> empty;
};

/// How finely water and heads are read.
struct Reader {
  double volume_division = 0.0;  ///< [m3]
  bool volume_by_level = false;  ///< the division is of the ruler, in the vessel where levels fall
  double random_error = 0.0;     ///< [m3]
  int seed = 1;
};

struct Test {
  std::string name;
  models::SingleRing ring;           ///< of a double ring the inner one
  double wall_thickness = 0.003;     ///< [m]; also in ring.wall
  models::ConstantHead protocol;     ///< `head` of the first stage that is not a soak; `longest` is
                                     ///< the whole test; `stop` only if a share of the mean
  double assumed_alpha_star = 12.0;  ///< the crew's [1/m]
  double ruler = 0.001;              ///< how finely the level is read [m]
  double head_kept = 0.005;          ///< how well the head is kept, to either side [m]

  RingProgram program;
  std::optional<models::SingleRing> outer_ring;
  RingProgram outer;
  VesselKind vessel = VesselKind::ring;
  double vessel_diameter = 0.0;    ///< of standpipe or tank [m]
  double evaporation = 0.0;        ///< of open water [m/s]
  std::optional<models::Lid> lid;  ///< on the (inner) ring
  double ballast_factor = 1.5;     ///< on the lift of the lid [-]
  std::optional<double>
      sealed_volume;  ///< of a closed inner ring whose flow is read by volume [m3]
  Reader reader;
  std::optional<models::StopRule> rule;  ///< of any kind; none: runs to the end
  std::vector<models::StopRule> also_judge;
  std::optional<double> height;  ///< of the ring, foot to rim [m]
};

}  // namespace ringwright::cases
