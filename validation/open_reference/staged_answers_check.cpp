/// The two-head ring and the double ring of the open reference as a user gets their answers, by its
/// rule of comparison: |difference| <= accuracy + 0.1 % + the row's own uncertainty, for volumes
/// from 5 % of the last time, flows from 25 %, all stage ends, the steady flows, and the Kfs of
/// each pair of stages.
///
/// The reference has flows at the ends of stages; an answer has means over the last reading, here
/// of 20 s. Its own flows change by 3 to 6 % from one stage to the next but one, 40 min later, so
/// by less than 0.05 % in the 10 s between; that is within the 0.1 % of the rule.

#include <fmt/format.h>

#include <catch2/catch.hpp>
#include <cmath>
#include <iostream>
#include <numbers>

#include "postprocess/reading/answer_question.hpp"
#include "postprocess/reading/companion_runs.hpp"
#include "validation/open_reference/staged_setups.hpp"

using namespace ringwright;
using namespace ringwright::validation;
using nlohmann::json;

namespace {

postprocess::Question question_of(const solver::TestSetup& setup, double interval,
                                  double accuracy) {
  postprocess::Question q;
  q.setup = setup;
  q.reading_interval = interval;
  q.assumed_alpha_star = 12.0;
  q.accuracy = accuracy;
  q.find_influence = false;
  return q;
}

void compare(const std::string& what, double ours, double reference, double accuracy,
             double uncertainty) {
  const double d = ours / reference - 1;
  CAPTURE(what, accuracy, ours, reference, 100 * d);
  CHECK(std::abs(d) <= accuracy + 0.001 + uncertainty);
  std::cout << fmt::format("{} at {:.1f} %: {:+.3f} %\n", what, 100 * accuracy, 100 * d);
}

double share(const json& row, const char* key) { return row[key].get<double>() / 100; }

double cubic_metres_per_second(const json& flow) {
  return flow.get<double>() * kCubicCentimetrePerHour;
}

}  // namespace

TEST_CASE("open reference: answer of the two-head ring", "[reference]") {
  const json all = reference_of("open_reference"), c = all["cases"]["P11"];
  const solver::TestSetup setup = reference_two_heads(all);
  const double area = std::numbers::pi * setup.ring.radius * setup.ring.radius;
  for (double accuracy : {0.01, 0.003}) {
    const postprocess::Answer a = postprocess::answer(question_of(setup, 20.0, accuracy));
    CHECK(a.accuracy_met);
    CHECK(a.balance_error <= 1e-6);
    REQUIRE(a.stages.size() == 4);
    for (std::size_t k = 0; k < 4; ++k) {
      const json row = c["rows"][k];
      compare(fmt::format("stage {} rate", k + 1), a.stages[k].rate.value * area,
              cubic_metres_per_second(row["flow_cm3_per_h"]), accuracy,
              share(row, "flow_uncertainty_percent"));
      compare(fmt::format("stage {} volume", k + 1), postprocess::volume_at(a.run, a.stages[k].to),
              row["volume_L"].get<double>() * kLitre, accuracy,
              share(row, "volume_uncertainty_percent"));
    }
    REQUIRE(a.pairs.size() == 3);
    const json kfs = c["Kfs_over_Ks_two_head"];
    const char* names[] = {"stage2-stage1", "stage2-stage3", "stage4-stage3"};
    for (std::size_t k = 0; k < 3; ++k) {
      compare(std::string("Kfs ") + names[k], a.pairs[k].reads.value, kfs[names[k]], accuracy,
              kKfsUncertainty);
      CHECK(a.pairs[k].reads.relative_error() <= accuracy);
    }
    std::cout << fmt::format("two-head answer at {:.1f} %: {} rounds, {} cells, {} steps\n",
                             100 * accuracy, a.refinements + 1, a.run.statistics.cells,
                             a.total_steps);
  }
}

TEST_CASE("open reference: answer of the double ring", "[reference]") {
  const json all = reference_of("open_reference"), c = all["cases"]["D1a"];
  const solver::TestSetup setup = reference_double_ring(all);
  const double a2 = setup.ring.radius * setup.ring.radius;
  const double b2 = setup.outer_ring->radius * setup.outer_ring->radius;
  const double inner = std::numbers::pi * a2, annulus = std::numbers::pi * (b2 - a2);
  // every time of the rows is a whole number of readings
  const double interval = 180.0;
  for (double accuracy : {0.01, 0.003}) {
    const postprocess::Answer a = postprocess::answer(question_of(setup, interval, accuracy));
    CHECK(a.accuracy_met);
    CHECK(a.balance_error <= 1e-6);
    REQUIRE(a.outer);
    int compared = 0;
    for (const json& row : c["rows"]) {
      const double t = row["time_h"].get<double>() * kHour;
      if (t < 0.05 * setup.duration) continue;
      const bool is_inner = row["ring"] == "inner";
      const auto& s = postprocess::sample_at(a.run, t);
      const solver::RingWater& water = is_inner ? s.water : s.outer_water;
      const std::string what =
          fmt::format("{} {:.2f} h", row["ring"].get<std::string>(), t / kHour);
      compare(what + " volume", water.soil, row["volume_L"].get<double>() * kLitre, accuracy,
              share(row, "volume_uncertainty_percent"));
      ++compared;
      if (t < setup.duration) continue;
      compare(what + " rate",
              is_inner ? a.ladder.back().rate.value * inner : a.outer->rate.value * annulus,
              cubic_metres_per_second(row["flow_cm3_per_h"]), accuracy,
              share(row, "flow_uncertainty_percent"));
    }
    CHECK(compared >= 4);
    compare("steady inner", a.steady_rate.value * inner,
            cubic_metres_per_second(c["steady_inner_flow_cm3_per_h"]), accuracy, 0.0005);
    compare("steady annulus", a.outer->steady_rate.value * annulus,
            cubic_metres_per_second(c["steady_annulus_flow_cm3_per_h"]), accuracy, 0.0005);
    std::cout << fmt::format("double ring answer at {:.1f} %: {} rounds, {} cells, {} steps\n",
                             100 * accuracy, a.refinements + 1, a.run.statistics.cells,
                             a.total_steps);
  }
}
