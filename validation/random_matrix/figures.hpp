#pragma once
/// The figures promised for a random case, their estimated errors and their true ones.

#include <algorithm>
#include <cmath>
#include <numbers>
#include <vector>

#include "postprocess/reading/answer_question.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "solver/steady_ring.hpp"
#include "validation/random_matrix/random_case.hpp"

namespace ringwright::validation {

/// A case as a question: no stop rule, twenty readings.
inline postprocess::Question question_of(const RandomCase& c, double accuracy) {
  postprocess::Question q;
  q.setup = c.setup;
  q.setup.times.clear();
  q.reading_interval = c.setup.duration / 20;
  q.assumed_alpha_star = 12.0;
  q.accuracy = accuracy;
  return q;
}

struct ErrorPair {
  double estimated, actual;  ///< relative
};

/// Every promised figure of an answer against a run at a finer resolution: volumes from 5 % of the
/// test, rates from 25 %, the steady rate. @param fine accuracy the finer run is made for
inline std::vector<ErrorPair> compare_with_finer(const postprocess::Answer& a, double fine) {
  using postprocess::Figure;
  const postprocess::Question& q = a.question;
  solver::TestSetup setup = q.setup;
  const double area = std::numbers::pi * setup.ring.radius * setup.ring.radius;
  for (const auto& s : a.run.samples) setup.times.push_back(s.time);
  const auto table = std::make_shared<solver::CurveTable>(setup.soil.curves);
  const solver::Resolution r =
      solver::resolution_for(setup, fine, table->capillary_length(), 0.05 * setup.duration);
  const solver::TestRun truth = solver::run_test(setup, r, table);
  const double steady =
      solver::steady_flow({setup.soil, setup.ring, setup.pond_head}, r, table).ring_flow / area;
  std::vector<ErrorPair> pairs;
  const auto add = [&](const Figure& f, double exact) {
    pairs.push_back({f.relative_error(), std::abs(f.value - exact) / std::abs(f.value)});
  };
  for (const postprocess::LadderRow& row : a.ladder) {
    const double t = row.time, before = std::max(0.0, t - q.reading_interval);
    const double volume = postprocess::volume_at(truth, t);
    if (t >= 0.05 * q.setup.duration) add(row.soil_volume, volume);
    if (t < 0.25 * q.setup.duration) continue;
    const double from = before > 1e-9 * t ? postprocess::volume_at(truth, before) : 0.0;
    const double rate = (volume - from) / (t - before) / area;
    add(row.rate, rate);
    const double ratio = rate / steady;
    pairs.push_back(
        {row.above_steady.error / ratio, std::abs(row.above_steady.value + 1 - ratio) / ratio});
  }
  add(a.steady_rate, steady);
  return pairs;
}

inline bool all_within(const std::vector<ErrorPair>& pairs) {
  return std::all_of(pairs.begin(), pairs.end(),
                     [](const ErrorPair& p) { return p.actual <= p.estimated; });
}

inline double largest_actual(const std::vector<ErrorPair>& pairs) {
  double worst = 0.0;
  for (const ErrorPair& p : pairs) worst = std::max(worst, p.actual);
  return worst;
}

inline double median(std::vector<double> values) {
  std::sort(values.begin(), values.end());
  return values[values.size() / 2];
}

}  // namespace ringwright::validation
