#include "postprocess/reading/refinement.hpp"

#include <catch2/catch.hpp>
#include <cmath>

#include "tests/postprocess/reading/staged_question.hpp"

using namespace ringwright;
using namespace ringwright::postprocess;

namespace {

solver::Resolution some_resolution() {
  solver::Resolution r;
  r.tip_cell = 0.01, r.top_cell = 0.002, r.splits = 0, r.theta_tolerance = 1e-3;
  return r;
}

Refinement refinement_of(const Question& q) { return {plan_of(q), q}; }

}  // namespace

TEST_CASE("tests of differences begin finer at the foot of the wall and in time", "[reading]") {
  const solver::Resolution asked = some_resolution();
  const auto simple = refinement_of(sandy_loam_question()).begin(asked);
  CHECK(simple.tip_cell == asked.tip_cell);
  CHECK(simple.theta_tolerance < asked.theta_tolerance);
  for (const Question& q : {two_head_question(), double_ring_question()}) {
    const auto more = refinement_of(q).begin(asked);
    CHECK(more.tip_cell < asked.tip_cell);
    CHECK(more.top_cell <= asked.top_cell);
    CHECK(more.theta_tolerance < simple.theta_tolerance);
  }
}

TEST_CASE("what is wrong is refined, and no more", "[reading]") {
  const solver::Resolution now = some_resolution();
  for (const Question& q : {sandy_loam_question(), two_head_question()}) {
    const Refinement refinement = refinement_of(q);  // at 1 %
    const auto mesh = refinement.next(now, {0.02, 0.02, 0.0001});
    CHECK(mesh.tip_cell < now.tip_cell);
    CHECK(mesh.top_cell < now.top_cell);
    CHECK(mesh.theta_tolerance == now.theta_tolerance);
    const auto time = refinement.next(now, {0.02, 0.0001, 0.02});
    CHECK(time.tip_cell == now.tip_cell);
    CHECK(time.theta_tolerance < now.theta_tolerance);
    // second order: cells by the square root of the error
    const auto less = refinement.next(now, {0.012, 0.010, 0.0}),
               more = refinement.next(now, {0.02, 0.015, 0.0});
    CHECK(more.tip_cell / less.tip_cell == Approx(std::sqrt(10.0 / 15.0)));
  }
}
