#include "postprocess/reading/time_to_steady.hpp"

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>

#include "solver/resolution.hpp"
#include "solver/steady_ring.hpp"
#include "tests/postprocess/reading/ring_question.hpp"

using namespace ringwright;
using namespace ringwright::postprocess;

namespace {

struct Approach {
  solver::TestSetup setup;
  std::shared_ptr<const solver::CurveTable> table;
  solver::Resolution resolution;

  explicit Approach(const solver::TestSetup& s)
      : setup(s),
        table(std::make_shared<solver::CurveTable>(s.soil.curves)),
        resolution(solver::resolution_for(s, 0.01, table->capillary_length(), 0.05 * s.duration)) {}

  TimeToSteady found() const {
    return time_to_steady(setup, resolution, solver::ground_materials(setup, table)).value();
  }

  // Flow over steady flow minus 1 at each of the times.
  std::vector<double> excess(const std::vector<double>& times) const {
    solver::TestSetup on = setup;
    on.times = times;
    on.duration = times.back();
    const double steady =
        solver::steady_flow({on.soil, on.ring, on.pond_head}, resolution, table).ring_flow;
    std::vector<double> e;
    for (const auto& s : solver::run_test(on, resolution, table).samples)
      e.push_back(s.ring_flow / steady - 1);
    return e;
  }
};

}  // namespace

TEST_CASE("a dry soil comes to steady from above", "[reading]") {
  const Approach approach(ring_question("sandy loam").setup);
  const TimeToSteady t = approach.found();
  REQUIRE_FALSE(t.beyond);
  REQUIRE(t.time > 0.0);
  // times are looked at in steps of a tenth
  const auto e =
      approach.excess({0.5 * t.time, 0.8 * t.time, 1.25 * t.time, 2 * t.time, 10 * t.time});
  CHECK(e[0] > 0.05);
  CHECK(e[1] > 0.05);
  for (std::size_t i : {2, 3, 4}) {
    CHECK(e[i] < 0.05);
    CHECK(e[i] > 0.0);
  }
}

TEST_CASE("a wet soil comes to steady from below, and the last time counts", "[reading]") {
  solver::TestSetup setup = ring_question("loam").setup;
  setup.initial_head = -0.05;
  const Approach approach(setup);
  const TimeToSteady t = approach.found();
  REQUIRE_FALSE(t.beyond);
  std::vector<double> times;
  for (double share = 1e-4; share < 0.85; share *= 1.3) times.push_back(share * t.time);
  const std::size_t before = times.size();
  for (double share : {1.25, 2.0, 5.0}) times.push_back(share * t.time);
  const auto e = approach.excess(times);
  // first above, then through the band, then below: the first crossing is not the answer
  CHECK(e.front() > 0.05);
  CHECK(*std::min_element(e.begin(), e.begin() + static_cast<long>(before)) < -0.05);
  CHECK(e[before - 1] < -0.05);
  for (std::size_t i = before; i < e.size(); ++i) CHECK(std::abs(e[i]) < 0.05);
}

TEST_CASE("a soil that needs more than 1000 h is said to", "[reading]") {
  solver::TestSetup setup = ring_question("clay").setup;
  setup.soil.Ks *= 1e-3;
  const TimeToSteady t = Approach(setup).found();
  CHECK(t.beyond);
  CHECK(t.time == Approx(1000.0 * 3600.0).epsilon(0.01));
}

TEST_CASE("time to steady does not depend on how long the test lasts", "[reading]") {
  Approach approach(ring_question("sandy loam").setup);
  const double t = approach.found().time;
  approach.setup.duration *= 0.2;
  CHECK(approach.found().time == Approx(t).epsilon(0.11));  // times are a tenth apart
  approach.setup.duration *= 50;
  CHECK(approach.found().time == Approx(t).epsilon(0.11));
}
