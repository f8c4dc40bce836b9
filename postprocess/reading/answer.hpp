#pragma once
/// The answer to one virtual test: what every screen, file and page is made from.
/// Each printed figure is a Figure: a value and the numerical error the program estimated for it.

#include <optional>
#include <string>
#include <vector>

#include "models/protocol/stop_rule.hpp"
#include "models/record/gauge.hpp"
#include "models/record/record.hpp"
#include "models/ring/lid.hpp"
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

/// What the flags need to know beyond the physical question. What is not known raises no flag.
struct Circumstances {
  std::optional<models::Lid> lid;       ///< of a closed ring under pressure
  std::optional<double> liner;          ///< thickness of the liner under test [m]
  std::optional<double> sealed_volume;  ///< water in a closed inner ring read by volume [m3]
  std::optional<double> bulk_density;   ///< of the ground over the foot of the wall, with its
                                        ///< water [kg/m3]; none: of grains of 2650 kg/m3 with
                                        ///< all pores full, theta_s of it but at least 40 %
  double water_temperature = 20.0;      ///< [degC]
  double ballast_factor = 1.5;          ///< on the lift (models/ring/lid_lift.hpp) [-]
};

/// What is asked of one test. Conductivities inside `setup` are at test temperature.
struct Question {
  solver::TestSetup setup;  ///< `duration` = longest; times and snapshots are filled in by answer()
  double reading_interval = 0.0;  ///< [s]
  models::Gauge gauge = {};       ///< the one by which the ring's water is read; as it is: exact
  std::vector<models::StopRule> rules;  ///< the first governs the test, all are judged; empty: the
                                        ///< rule of the next two fields
  int stop_readings = 0;                ///< stop rule: last n readings ...
  double stop_within = 0.0;        ///< ... within this fraction of their mean; 0 readings: no rule
  double assumed_alpha_star = 0;   ///< the crew's alpha* [1/m]
  std::optional<double> true_Kfs;  ///< what readings are held against, at test temperature [m/s];
                                   ///< none: Ks of the layer that holds the foot of the wall
  double viscosity_ratio = 1.0;    ///< mu(test temperature) / mu(20 degC): K20 = K * ratio
  Circumstances circumstances = {};
  bool find_influence = true;  ///< whether the depth of influence is looked for (some coarse runs)
  double accuracy = 0.01;      ///< asked for, relative, every printed figure
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

/// One stage of a test with a program, as the crew reads it at its end, or at the stop where that
/// comes before.
struct StageReading {
  std::size_t stage = 0;                  ///< index into the program
  double from = 0.0, to = 0.0;            ///< [s]
  double head_from = 0.0, head_to = 0.0;  ///< true head at the ends [m]
  Figure rate;  ///< mean over the last reading interval of the stage [m/s], into the ground;
                ///< value 0 for a soak, which is not read
  double rate_as_read = 0.0;  ///< the same from the record as read [m/s]
  Figure soil_volume;         ///< into the ground in this stage [m3]
  Figure steady_rate;         ///< at the head of a constant stage [m/s]; value 0 for a falling one
  bool soak = false;
};

/// Two neighbouring stages at different constant heads read together (two-ponding-depth formula,
/// D = 0.993 d + 0.578 a). Rates are means over the last reading interval of each stage.
struct HeadPair {
  std::size_t first = 0, second = 0;  ///< indices into the stage readings
  Figure kfs;                         ///< [m/s], test temperature; of the true record
  Figure reads;                       ///< kfs over true Kfs [-]
  double kfs_as_read = 0.0;           ///< from rates and heads of the record as read [m/s]; NaN
                                      ///< where both heads were read the same
  bool physical = true;               ///< arrived, Kfs and matric flux potential above 0
  bool physical_as_read = true;       ///< the same from the record as read
  bool arrived = true;                ///< the level was at the head set at the end of both stages
};

/// Where the water of one ring went until the stop: supply = soil + standing + evaporated +
/// removed.
struct WaterUse {
  Figure soil;              ///< [m3]
  Figure supply;            ///< [m3]
  double standing = 0.0;    ///< [m3]
  double evaporated = 0.0;  ///< [m3]
  double removed = 0.0;     ///< bailed, bled or spilt [m3]
  double peak_flow = 0.0;   ///< largest mean over 60 s of what the supply gives, the first filling
                            ///< at the supply's own rate [m3/s]: where that is not limited the
                            ///< filling is poured before the test and not part of it
};

enum class FlagKind {
  supply_exceeded,    ///< value: head lost [m], the most at any reading; limit: head set then [m]
  reservoir_emptied,  ///< value: first time [s]; limit: its volume [m3]
  ring_emptied,      ///< no water stood in the ring in the last reading or part of it; value: since
                     ///< when [s]
  flow_below_gauge,  ///< value: divisions of the gauge in the reading at the stop; limit: least
  surfacing,         ///< value: water welling up outside [m3]; limit: first time [s]; place [m]
  piping,            ///< value: H/(2d) [-]; limit: critical exit gradient [-]
  fracture,          ///< value: water pressure at the foot over the soil's weight there [-]; 1
  evaporation_share,   ///< value: evaporation over soil intake in the last reading [-]; limit
  stop_rule_not_met,   ///< value: true rate at the end over steady rate minus 1 [-]
  domain_reached,      ///< the mesh could not be made large enough; value: its depth [m]
  insertion_share,     ///< value: insertion over the liner's thickness [-]; limit
  sealed_temperature,  ///< value: volume per degC [m3]; limit: a tenth of the daily flow [m3]
  lid_lift,            ///< value: lift [N]; limit: weight of lid and ring [N]
  lid_not_for_use      ///< a lidded test without stated relief and rating, or rated too low; value:
                       ///< relief head, limit: rating [m], 0 where not stated
};

/// Something the crew must know. Words and cure: cases/simulate.
struct Flag {
  FlagKind kind = FlagKind::stop_rule_not_met;
  double value = 0.0, limit = 0.0;
  double place = 0.0;  ///< surfacing: largest radius [m]; lid_lift: ballast to lay on [kg],
                       ///< NaN where the highest pressure is not stated
  bool outer = false;  ///< of the outer ring
};

/// What one stop rule would do, judged on the record as read up to the longest time.
struct RuleVerdict {
  models::StopRule rule;
  std::optional<double> stop;  ///< [s]; none: not met
  Figure rate;                 ///< as truly was, mean of the last reading [m/s]; value 0: not met
  Figure above_steady;         ///< that rate over the steady one at the head of the stage, minus 1
                               ///< [-]; value 0 in a falling head, which has none
  Figure supply_volume;        ///< [m3]
};

/// Depth below which doubling K moves the rate at the stop by less than 5 %.
struct DepthOfInfluence {
  double depth = 0.0;  ///< [m]; 0: not even doubling all of it moves the rate by 5 %
  bool known = false;  ///< false: not asked for, interrupted, or deeper than the ground computed
};

/// The annulus of a double ring, at the stop.
struct OuterReading {
  Figure rate;         ///< mean over the last reading interval [m/s], over the annulus' area
  Figure steady_rate;  ///< [m/s]; value 0: no constant heads
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
  models::Record record;   ///< true readings up to the stop, into the ground; a soak is not read
  models::Record as_read;  ///< the same readings as the crew has them: through the gauge, and with
                           ///< what evaporates, which an open pond does not tell from intake
  std::vector<LadderRow> ladder;  ///< ascending; one row has stops_here. Only where the heads are
                                  ///< constant from start to end (single and double ring)
  std::vector<StageReading> stages;   ///< of a program, soak included; empty without
  std::vector<HeadPair> pairs;        ///< neighbours among the constant stages that were read
  std::vector<RuleVerdict> verdicts;  ///< one for each rule, the governing one first
  bool stop_rule_met = true;          ///< false: ended at the longest time allowed
  bool ended_early = false;           ///< the reservoir was empty and the protocol ends there
  Figure steady_rate;  ///< at the head of the last constant stage [m/s]; value 0: there is none
  ReadsX steady_reads;
  TimeToSteady time_to_steady;  ///< where the heads are constant from start to end; else 0
  double peak_flow = 0.0;       ///< largest mean soil intake over 60 s, filling apart [m3/s]
  double filling_volume = 0.0;  ///< pond at the first head [m3]
  WaterUse water;               ///< of the (inner) ring
  std::optional<WaterUse> outer_water;  ///< of the annulus of a double ring
  std::optional<OuterReading> outer;
  std::vector<Flag> flags;
  DepthOfInfluence influence;
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
