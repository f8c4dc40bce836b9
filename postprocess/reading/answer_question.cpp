#include "postprocess/reading/answer_question.hpp"

#include <algorithm>
#include <cmath>
#include <mutex>

#include "models/soil/capillary_length.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "postprocess/reading/depth_of_influence.hpp"
#include "postprocess/reading/flags/flags.hpp"
#include "postprocess/reading/read_runs.hpp"
#include "postprocess/reading/refinement.hpp"
#include "postprocess/reading/rule_verdicts.hpp"
#include "postprocess/reading/test_plan.hpp"
#include "postprocess/reading/test_record.hpp"
#include "postprocess/reading/time_to_steady.hpp"
#include "postprocess/reading/true_kfs.hpp"
#include "postprocess/reading/water_use.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/ground_materials.hpp"
#include "solver/resolution.hpp"

namespace ringwright::postprocess {
namespace {

constexpr double kVolumesFrom = 0.05;  // of the stop: when volumes are promised
constexpr int kMostRefinements = 6;
// The estimate is two to four times the error: begin finer than the accuracy needs, so that one
// set of runs mostly does.
constexpr double kBeginAt = 0.36;
constexpr int kMostCells = 20000;
constexpr double kPeakInterval = 60.0;  // [s]
constexpr int kSnapshots = 12;
// Progress told: the pilot up to the first, the time to steady from the second.
constexpr double kPilotShare = 0.05, kSteadyShare = 0.9;

class Answering {
 public:
  Answering(const Question& question, const ProgressObserver& observer,
            std::shared_ptr<const solver::CurveTable> table)
      : observer_(observer), table_(std::move(table)) {
    answer_.question = question;
    if (!table_) table_ = std::make_shared<solver::CurveTable>(question.setup.soil.curves);
    materials_ = solver::ground_materials(question.setup, table_);
    plan_ = plan_of(question);
    setup_ = question.setup;
    setup_.times = wanted_times(question, plan_);
    for (int k = 1; k <= kSnapshots; ++k)  // denser early, when the wetted body grows fastest
      setup_.snapshots.push_back(setup_.duration * (k * k) / (kSnapshots * kSnapshots));
  }

  Answer run();

 private:
  double pilot_stop(const solver::Resolution& resolution);
  void run_until_accurate();
  void describe_soil();
  void finish();
  void look_deeper();
  solver::StepObserver observe(double from, double to);
  bool report(double fraction);

  const Question& question() const { return answer_.question; }

  ProgressObserver observer_;
  std::mutex observing_;
  double done_ = 0.0;  // told last [-]
  std::shared_ptr<const solver::CurveTable> table_;
  std::vector<solver::Material> materials_;
  TestPlan plan_;
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
  if (rules_of(question()).empty()) return setup_.duration;
  solver::TestSetup plain = setup_;
  plain.snapshots.clear();
  const solver::TestRun run =
      solver::run_test(plain, resolution, materials_, observe(0.0, kPilotShare));
  if (run.interrupted) return setup_.duration;
  const models::Record record = record_as_read(question(), plan_, run);
  if (record.readings.empty()) return setup_.duration;
  return record.readings[stop_of(question(), plan_, record).reading].time;
}

void Answering::run_until_accurate() {
  const double lambda = table_->capillary_length(), accuracy = question().accuracy;
  first_resolution_ =
      solver::resolution_for(setup_, kBeginAt * accuracy, lambda, kVolumesFrom * setup_.duration);
  const double stop = pilot_stop(first_resolution_.coarser());
  add_times(setup_.snapshots, {stop});
  resolution_ = solver::resolution_for(setup_, kBeginAt * accuracy, lambda, kVolumesFrom * stop);
  const Refinement refinement(plan_, question());
  resolution_ = refinement.begin(resolution_);
  double from = kPilotShare;
  for (;; ++answer_.refinements) {
    // How many rounds there will be is not known: each takes half of what is left.
    const double to = from + 0.5 * (kSteadyShare - from);
    CompanionRuns next =
        run_companions({setup_, materials_, plan_.held_heads()}, resolution_, question().threads,
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
    worst_ = read_runs(plan_, runs_, answer_);
    answer_.worst_relative_error = worst_.relative_error;
    answer_.accuracy_met = worst_.relative_error <= accuracy;
    if (answer_.accuracy_met || answer_.refinements == kMostRefinements || s.cells > kMostCells)
      return;
    resolution_ = refinement.next(resolution_, worst_);
  }
}

void Answering::describe_soil() {
  const models::Soil& soil = setup_.soil;
  const double h = solver::head_before(setup_, 0, 0.0);
  answer_.initial_water_content = soil.water_content(h);
  answer_.initial_saturation = soil.curves->saturation(h);
  answer_.own_capillary_length = models::capillary_length(*foot_soil(setup_).curves);
}

// What does not belong to the promised figures and is found once.
void Answering::finish() {
  const double first = std::min(kPeakInterval, setup_.duration);
  if (runs_.fine.samples.front().time <= first * (1 + 1e-9) &&
      runs_.fine.samples.back().time >= first * (1 - 1e-9))
    answer_.peak_flow = volume_at(runs_.fine, first) / first;
  const std::size_t last = answer_.record.readings.size() - 1;
  answer_.flags = raise_flags({.question = question(),
                               .plan = plan_,
                               .run = runs_.fine,
                               .stop = stop_time(answer_),
                               .rule_met = answer_.stop_rule_met,
                               .above_steady = excess_of_reading(plan_, runs_, last).value});
}

// Runs of their own, coarser.
void Answering::look_deeper() {
  const auto going = [this] { return report(kSteadyShare); };
  if (plan_.is_constant) {
    const auto steady = time_to_steady(setup_, first_resolution_, materials_, going);
    answer_.time_to_steady = steady.value_or(TimeToSteady{});
    answer_.interrupted = answer_.interrupted || !steady;
  }
  if (question().find_influence && !answer_.interrupted)
    answer_.influence = depth_of_influence(question().setup, stop_time(answer_),
                                           answer_.wetted_depth.value, table_, going);
  answer_.interrupted = answer_.interrupted || !going();
}

Answer Answering::run() {
  describe_soil();
  answer_.filling_volume = filling_volume(setup_);
  run_until_accurate();
  if (answer_.interrupted &&
      answer_.refinements == 0) {  // interrupted before anything was complete
    answer_.record = true_record(question(), plan_, runs_.fine);
    answer_.as_read = record_as_read(question(), plan_, runs_.fine);
  } else if (!answer_.record.readings.empty()) {
    finish();
    look_deeper();
  } else {  // the reservoir was empty before the first reading
    answer_.flags = raise_flags({question(), plan_, runs_.fine, 0.0, answer_.stop_rule_met, 0.0});
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
