#pragma once
/// The answer to one virtual test: what every screen, file and page is made from.
/// Each printed figure is a Figure: a value and the numerical error the program estimated for it.

#include <optional>
#include <string>
#include <vector>

#include "models/protocol/stop_rule.hpp"
#include "models/record/gauge.hpp"
#include "models/record/record.hpp"
#include "solver/virtual_test.hpp"

namespace ringwright::postprocess {

struct Figure {
  double value = 0.0;
  double error = 0.0;  ///< estimated numerical error, absolute, same unit as value
  /// |error / value|
  double relative_error() const {
    return value != 0.0 ? (error < 0 ? -error : error) / (value < 0 ? -value : value) : 0.0;
  }
};

/// What is asked of one test. Conductivities inside `setup` are at test temperature.
struct Question {
  solver::TestSetup setup;  ///< `duration` = longest; times and snapshots are filled in by answer()
  double reading_interval = 0.0;  ///< [s]
  int stop_readings = 0;          ///< stop rule: last n readings ...
  double stop_within = 0.0;       ///< ... within this fraction of their mean; 0 readings: no rule
  double assumed_alpha_star = 0;  ///< the crew's alpha* [1/m]
  double viscosity_ratio = 1.0;   ///< mu(test temperature) / mu(20 degC): K20 = K * ratio
  double accuracy = 0.01;         ///< asked for, relative, every printed figure
  int threads = 1;  ///< companion runs may go side by side; never changes a bit of the result
};

/// Bias of the three readings of the same rate; reported Kfs over true Kfs (both at test
/// temperature).
struct ReadsX {
  Figure rate_as_kfs;          ///< the rate itself taken as Kfs
  Figure one_head;             ///< Reynolds & Elrick 1990, assumed alpha*
  Figure one_head_own_lambda;  ///< the same with the soil's own capillary length: not available to
                               ///< a crew
};

/// One stage of a test with several, as the crew reads it at its end.
struct StageReading {
  std::size_t stage = 0;                  ///< index into the program
  double from = 0.0, to = 0.0;            ///< [s]
  double head_from = 0.0, head_to = 0.0;  ///< true head at the ends [m]
  Figure rate;         ///< mean over the last reading interval of the stage [m/s]; of a falling
                       ///< head too: into the ground, by the drop of the level
  Figure soil_volume;  ///< into the ground in this stage [m3]
  Figure steady_rate;  ///< at the head of a constant stage [m/s]; value 0 for a falling one
  bool soak = false;
};

/// Two stages at different heads read together (two-ponding-depth formula).
struct HeadPair {
  std::size_t first = 0, second = 0;  ///< indices into the stage readings
  Figure kfs;                         ///< [m/s], test temperature; of the true record
  Figure reads;                       ///< kfs over true Kfs [-]
  double kfs_as_read = 0.0;           ///< from the record as read [m/s]
  bool physical = true;               ///< Kfs and matric flux potential above 0
};

/// Where the water of one ring went until the stop.
struct WaterUse {
  Figure soil;              ///< [m3]
  Figure supply;            ///< [m3]
  double standing = 0.0;    ///< [m3]
  double evaporated = 0.0;  ///< [m3]
  double removed = 0.0;     ///< bailed, bled or spilt [m3]
  double peak_flow = 0.0;   ///< largest mean over 60 s of what the supply gives [m3/s]
};

enum class FlagKind {
  supply_exceeded,     ///< value: head lost [m]; limit: head set [m]
  reservoir_emptied,   ///< value: time [s]; limit: its volume [m3]
  flow_below_gauge,    ///< value: divisions of the gauge per reading at the stop; limit: least
  surfacing,           ///< value: litres welling up outside [m3]; limit: first time [s]
  piping,              ///< value: H/(2d) [-]; limit
  fracture,            ///< value: water pressure at the foot over the soil's weight there [-]
  evaporation_share,   ///< value: evaporation over inflow at the stop [-]; limit
  stop_rule_not_met,   ///< value: rate over steady rate minus 1 [-]
  domain_reached,      ///< the mesh could not be made large enough
  insertion_share,     ///< value: insertion over the liner's thickness [-]; limit
  sealed_temperature,  ///< value: volume per degC [m3]; limit: daily flow [m3]
  lid_lift,            ///< value: lift [N]; limit: weight of lid and ring [N]
  lid_not_for_use      ///< a lidded test without stated relief and rating
};

/// Something the crew must know. Words and cure: cases/simulate.
struct Flag {
  FlagKind kind = FlagKind::stop_rule_not_met;
  double value = 0.0, limit = 0.0;
};

/// What one stop rule would do.
struct RuleVerdict {
  models::StopRule rule;
  std::optional<double> stop;  ///< [s]; none: not met
  Figure rate;                 ///< as truly was, at that stop [m/s]
  Figure above_steady;         ///< true rate at that moment over steady, minus 1 [-]
  Figure supply_volume;        ///< [m3]
};

/// Depth below which doubling K moves the rate at the stop by less than 5 %.
struct DepthOfInfluence {
  double depth = 0.0;  ///< [m]
  bool known = false;
};

struct LadderRow {
  double time = 0.0;     ///< [s]
  Figure rate;           ///< mean over the reading interval that ends here [m/s], test temperature
  Figure soil_volume;    ///< into the ground [m3]
  Figure supply_volume;  ///< soil + pond (filling) [m3]
  ReadsX reads;
  Figure above_steady;      ///< rate over steady rate minus 1 [-]
  bool stops_here = false;  ///< the stop rule ends the test here
};

struct TimeToSteady {
  double time = 0.0;    ///< last time the flow is more than 5 % from steady [s]
  bool beyond = false;  ///< true: not reached, time is the limit looked at
};

struct Answer {
  Question question;
  models::Record record;          ///< readings up to the stop
  std::vector<LadderRow> ladder;  ///< ascending; one row has stops_here
  bool stop_rule_met = true;      ///< false: ended at the longest time allowed
  Figure steady_rate;             ///< [m/s]
  ReadsX steady_reads;
  TimeToSteady time_to_steady;
  double peak_flow = 0.0;              ///< largest mean soil intake over 60 s, filling apart [m3/s]
  double filling_volume = 0.0;         ///< pond [m3]
  Figure wetted_depth;                 ///< at the stop [m]
  Figure wetted_beyond_wall;           ///< at the stop [m]
  double initial_water_content = 0.0;  ///< [-]
  double initial_saturation = 0.0;     ///< effective saturation Se [-]
  double own_capillary_length =
      0.0;  ///< of the soil from dryness to 0: that of the steady flow [m]
  double worst_relative_error = 0.0;  ///< largest over all promised figures [-]
  bool accuracy_met = false;
  int refinements = 0;
  solver::TestRun run;                           ///< the finest run, with fields
  double balance_error = 0.0;                    ///< of that run, over throughput [-]
  long total_steps = 0;                          ///< over all companion runs
  std::optional<solver::Resolution> resolution;  ///< of the finest run, for provenance
  bool interrupted = false;  ///< stopped by the user; what is there is valid up to the last sample
};

}  // namespace ringwright::postprocess
