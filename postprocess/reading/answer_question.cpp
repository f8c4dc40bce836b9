#include "postprocess/reading/answer_question.hpp"

#include <algorithm>
#include <cmath>
#include <mutex>
#include <numbers>

#include "models/soil/capillary_length.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/ladder.hpp"
#include "postprocess/reading/stop_rule.hpp"
#include "postprocess/reading/test_times.hpp"
#include "postprocess/reading/time_to_steady.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"

namespace ringwright::postprocess {
namespace {

constexpr double kVolumesFrom = 0.05;  // of the stop: when volumes are promised
constexpr int kMostRefinements = 6;
constexpr double kMeshShare = 0.6;  // of the accuracy, aimed at for the mesh when refining
// The estimate is two to four times the error: begin finer than the accuracy needs, so that one
// set of runs mostly does.
constexpr double kBeginAt = 0.36;
constexpr double kBeginTolerance = 0.5;
constexpr int kMostCells = 40000;
constexpr double kPeakInterval = 60.0;  // [s]
constexpr int kSnapshots = 12;
// Progress told: the pilot up to the first, the time to steady from the second.
constexpr double kPilotShare = 0.05, kSteadyShare = 0.9;

void add_times(std::vector<double>& times, const std::vector<double>& more) {
  times.insert(times.end(), more.begin(), more.end());
  std::sort(times.begin(), times.end());
  const auto same = [](double a, double b) { return b - a <= 1e-9 * b; };
  times.erase(std::unique(times.begin(), times.end(), same), times.end());
}

// Everything that any row may ask for: readings, stopping times, and one interval before each.
std::vector<double> wanted_times(const Question& q) {
  std::vector<double> times = reading_times(q.reading_interval, q.setup.duration);
  for (double t : stopping_times(q.reading_interval, q.setup.duration)) {
    times.push_back(t);
    if (t > q.reading_interval * (1 + 1e-9)) times.push_back(t - q.reading_interval);
  }
  const double before_end = q.setup.duration - q.reading_interval;
  if (before_end > 1e-9 * q.setup.duration) times.push_back(before_end);
  times.push_back(std::min(kPeakInterval, q.setup.duration));
  add_times(times, {});
  return times;
}

models::Record record_of(const Question& q, const solver::TestRun& run) {
  models::Record record;
  record.ring_area = std::numbers::pi * q.setup.ring.radius * q.setup.ring.radius;
  double before = 0.0, volume_before = 0.0;
  for (double t : reading_times(q.reading_interval, q.setup.duration)) {
    if (run.samples.empty() || t > run.samples.back().time * (1 + 1e-9)) break;
    const double volume = volume_at(run, t);
    record.readings.push_back({t, t - before, volume - volume_before, volume, q.setup.pond_head});
    before = t;
    volume_before = volume;
  }
  return record;
}

// The stop by the rule on a record; the last reading when the rule is never met.
struct Stop {
  std::size_t reading = 0;
  bool rule_met = true;
};

Stop stop_of(const Question& q, const models::Record& record) {
  const std::size_t last = record.readings.size() - 1;
  if (q.stop_readings == 0) return {last, true};
  const auto found = first_steady_reading(record, q.stop_readings, q.stop_within);
  return {found.value_or(last), found.has_value()};
}

class Answering {
 public:
  Answering(const Question& question, const ProgressObserver& observer,
            std::shared_ptr<const solver::CurveTable> table)
      : observer_(observer), table_(std::move(table)) {
    answer_.question = question;
    if (!table_) table_ = std::make_shared<solver::CurveTable>(question.setup.soil.curves);
    setup_ = question.setup;
    setup_.times = wanted_times(question);
    for (int k = 1; k <= kSnapshots; ++k)  // denser early, when the wetted body grows fastest
      setup_.snapshots.push_back(setup_.duration * (k * k) / (kSnapshots * kSnapshots));
  }

  Answer run();

 private:
  double pilot_stop(const solver::Resolution& resolution);
  void run_until_accurate();
  void refine(solver::Resolution& resolution) const;
  void read();
  void describe_soil();
  solver::StepObserver observe(double from, double to);
  bool report(double fraction);

  const Question& question() const { return answer_.question; }

  ProgressObserver observer_;
  std::mutex observing_;
  double done_ = 0.0;  // told last [-]
  std::shared_ptr<const solver::CurveTable> table_;
  solver::TestSetup setup_;
  CompanionRuns runs_;
  WorstFigure worst_;
  solver::Resolution first_resolution_, resolution_;
  Answer answer_;
};

// Runs may go side by side: the user's observer is called by one thread at a time.
bool Answering::report(double fraction) {
  if (!observer_) return true;
  const std::scoped_lock lock(observing_);
  done_ = std::max(done_, fraction);
  return observer_(done_);
}

solver::StepObserver Answering::observe(double from, double to) {
  return [this, from, to](double t) {
    return report(from + (to - from) * std::sqrt(std::min(1.0, t / setup_.duration)));
  };
}

// A cheap run to learn when the rule would stop the test: that decides which figures are promised.
double Answering::pilot_stop(const solver::Resolution& resolution) {
  if (question().stop_readings == 0) return setup_.duration;
  solver::TestSetup plain = setup_;
  plain.snapshots.clear();
  const solver::TestRun run =
      solver::run_test(plain, resolution, table_, observe(0.0, kPilotShare));
  if (run.interrupted) return setup_.duration;
  const models::Record record = record_of(question(), run);
  return record.readings[stop_of(question(), record).reading].time;
}

void Answering::run_until_accurate() {
  const double lambda = table_->capillary_length(), accuracy = question().accuracy;
  first_resolution_ =
      solver::resolution_for(setup_, kBeginAt * accuracy, lambda, kVolumesFrom * setup_.duration);
  const double stop = pilot_stop(first_resolution_.coarser());
  add_times(setup_.snapshots, {stop});
  resolution_ = solver::resolution_for(setup_, kBeginAt * accuracy, lambda, kVolumesFrom * stop);
  resolution_.theta_tolerance *= kBeginTolerance;
  double from = kPilotShare;
  for (;; ++answer_.refinements) {
    // How many rounds there will be is not known: each takes half of what is left.
    const double to = from + 0.5 * (kSteadyShare - from);
    CompanionRuns next = run_companions(setup_, resolution_, table_, question().threads,
                                        observe(from, to), [this] { return report(0.0); });
    from = to;
    answer_.interrupted = next.interrupted;
    // An interrupted refinement leaves the complete set before it.
    if (answer_.interrupted && answer_.refinements > 0) return;
    runs_ = std::move(next);
    runs_.floor = error_floor(accuracy);
    if (answer_.interrupted) return;
    const auto& s = runs_.fine.statistics;
    answer_.total_steps += s.steps + runs_.coarse.statistics.steps + runs_.loose.statistics.steps;
    read();
    answer_.accuracy_met = worst_.relative_error <= accuracy;
    if (answer_.accuracy_met || answer_.refinements == kMostRefinements || s.cells > kMostCells)
      return;
    refine(resolution_);
  }
}

// Errors of the mesh fall about with the square of the cell size, those of time with the tolerance.
void Answering::refine(solver::Resolution& resolution) const {
  const double accuracy = question().accuracy;
  if (worst_.time_part > 0.3 * accuracy) resolution.theta_tolerance *= 0.3;
  if (worst_.mesh_part > kMeshShare * accuracy)
    resolution = resolution.scaled(
        std::clamp(std::sqrt(kMeshShare * accuracy / worst_.mesh_part), 0.4, 0.9));
}

void Answering::read() {
  answer_.record = record_of(question(), runs_.fine);
  const Stop stop = stop_of(question(), answer_.record);
  answer_.stop_rule_met = stop.rule_met;
  answer_.record.readings.resize(stop.reading + 1);
  const Ladder ladder = make_ladder(question(), runs_, answer_.record.readings.back().time);
  answer_.ladder = ladder.rows;
  answer_.steady_rate = ladder.steady_rate;
  answer_.steady_reads = ladder.steady_reads;
  worst_ = ladder.worst;
  answer_.worst_relative_error = worst_.relative_error;
}

void Answering::describe_soil() {
  const models::Soil& soil = setup_.soil;
  const double h = setup_.initial_head;
  answer_.initial_water_content = soil.water_content(h);
  answer_.initial_saturation = soil.curves->saturation(h);
  answer_.own_capillary_length = models::capillary_length(*soil.curves);
}

Answer Answering::run() {
  describe_soil();
  answer_.filling_volume =
      std::numbers::pi * setup_.ring.radius * setup_.ring.radius * setup_.pond_head;
  run_until_accurate();
  if (answer_.interrupted &&
      answer_.refinements == 0) {  // interrupted before anything was complete
    answer_.record = record_of(question(), runs_.fine);
  } else {
    answer_.peak_flow = volume_at(runs_.fine, std::min(kPeakInterval, setup_.duration)) /
                        std::min(kPeakInterval, setup_.duration);
    const double stop = answer_.record.readings.back().time;
    answer_.wetted_depth =
        runs_.figure([stop](const solver::TestRun& r) { return sample_at(r, stop).wetted.depth; });
    answer_.wetted_beyond_wall = runs_.figure(
        [stop](const solver::TestRun& r) { return sample_at(r, stop).wetted.beyond_wall; });
    const auto steady =
        time_to_steady(setup_, first_resolution_, table_, [this] { return report(kSteadyShare); });
    answer_.time_to_steady = steady.value_or(TimeToSteady{});
    answer_.interrupted = answer_.interrupted || !steady;
  }
  answer_.run = std::move(runs_.fine);
  answer_.resolution = resolution_;
  answer_.balance_error = answer_.run.statistics.balance_error;
  if (!answer_.interrupted) report(1.0);
  return std::move(answer_);
}

}  // namespace

Answer answer(const Question& question, const ProgressObserver& observer,
              std::shared_ptr<const solver::CurveTable> table) {
  return Answering(question, observer, std::move(table)).run();
}

}  // namespace ringwright::postprocess
