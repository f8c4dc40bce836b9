#include "solver/virtual_test.hpp"

#include <catch2/catch.hpp>
#include <cmath>
#include <cstring>

#include "solver/failure.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

TestSetup loam_test() {
  TestSetup s;
  s.soil = class_soil("loam");
  s.initial_head = -3.0;
  s.ring = {0.10, 0.05, 0.003};
  s.pond_head = 0.05;
  s.duration = 7200.0;
  s.times = {600.0, 1800.0, 3600.0, 7200.0};
  return s;
}

Resolution resolution(const TestSetup& setup) {
  const CurveTable table(setup.soil.curves);
  return resolution_for(setup, 0.01, table.capillary_length(), setup.times.front());
}

TestRun run(const TestSetup& setup) { return run_test(setup, resolution(setup)); }

}  // namespace

// Similarity of the flow equation: with heads, ring and moisture kept, time scales with 1/Ks and
// volumes stay (Miller & Miller 1956, J. Appl. Phys. 27:324, for alpha kept).
TEST_CASE("seven times Ks in a seventh of the time gives the same volumes", "[solver]") {
  for (const char* texture : {"sand", "loam", "clay"}) {
    TestSetup setup = loam_test();
    setup.soil = class_soil(texture);
    const TestRun slow = run(setup);
    setup.soil.Ks *= 7;
    setup.duration /= 7;
    for (double& t : setup.times) t /= 7;
    const TestRun fast = run(setup);
    CAPTURE(texture);
    REQUIRE(slow.samples.size() == 4);
    REQUIRE(fast.samples.size() == 4);
    for (std::size_t i = 0; i < 4; ++i) {
      const Sample &a = slow.samples[i], &b = fast.samples[i];
      CHECK(b.ring_volume == Approx(a.ring_volume).epsilon(1e-6));
      CHECK(b.ring_flow == Approx(7 * a.ring_flow).epsilon(1e-6));
      CHECK(b.stored_volume == Approx(a.stored_volume).epsilon(1e-6));
    }
  }
}

// The same similarity: volume and time scale with theta_s - theta_r, flows stay.
TEST_CASE("0.4 times the fillable porosity in 0.4 of the time gives 0.4 of the volumes",
          "[solver]") {
  TestSetup setup = loam_test();
  const Resolution fine = resolution(setup);
  const TestRun full = run_test(setup, fine);
  setup.soil.theta_s = setup.soil.theta_r + 0.4 * (setup.soil.theta_s - setup.soil.theta_r);
  setup.duration *= 0.4;
  for (double& t : setup.times) t *= 0.4;
  Resolution scaled = fine;
  scaled.theta_tolerance *= 0.4;
  const TestRun less = run_test(setup, scaled);
  for (std::size_t i = 0; i < 4; ++i) {
    CHECK(less.samples[i].ring_volume == Approx(0.4 * full.samples[i].ring_volume).epsilon(1e-6));
    CHECK(less.samples[i].ring_flow == Approx(full.samples[i].ring_flow).epsilon(1e-6));
  }
}

TEST_CASE("two runs one after the other give the same bits", "[solver]") {
  const TestSetup setup = loam_test();
  const TestRun a = run(setup), b = run(setup);
  REQUIRE(a.samples.size() == b.samples.size());
  CHECK(std::memcmp(a.samples.data(), b.samples.data(), a.samples.size() * sizeof(Sample)) == 0);
  CHECK(a.statistics.steps == b.statistics.steps);
}

TEST_CASE("a shared table gives the same bits as an own one", "[solver]") {
  const TestSetup setup = loam_test();
  const auto table = std::make_shared<CurveTable>(setup.soil.curves);
  const TestRun a = run(setup), b = run_test(setup, resolution(setup), table);
  CHECK(std::memcmp(a.samples.data(), b.samples.data(), a.samples.size() * sizeof(Sample)) == 0);
}

TEST_CASE("samples add up: intake is storage and drainage and seepage", "[solver]") {
  for (double insertion : {0.0, 0.02, 0.10}) {
    TestSetup setup = loam_test();
    setup.ring.insertion = insertion;
    const TestRun r = run(setup);
    CAPTURE(insertion);
    CHECK(r.statistics.balance_error < 1e-5);
    double before = 0.0;
    for (const Sample& s : r.samples) {
      const double used = s.stored_volume + s.drainage_volume + s.seepage_volume;
      CHECK(s.ring_volume == Approx(used).epsilon(2e-5));
      CHECK(s.ring_volume > before);
      CHECK(s.ring_flow > 0.0);
      before = s.ring_volume;
    }
  }
}

TEST_CASE("samples do not depend on which others are wanted", "[solver]") {
  TestSetup setup = loam_test();
  const TestRun four = run_test(setup, resolution(setup));
  const Resolution same = resolution(setup);
  setup.times = {3600.0};
  const TestRun one = run_test(setup, same);
  REQUIRE(one.samples.size() == 1);
  CHECK(one.samples[0].ring_volume == four.samples[2].ring_volume);
}

TEST_CASE("snapshots: heads and contents of all cells, wet under the ring", "[solver]") {
  TestSetup setup = loam_test();
  setup.snapshots = {600.0, 7200.0};
  const TestRun r = run(setup);
  REQUIRE(r.snapshots.size() == 2);
  const auto cells = static_cast<std::size_t>(r.statistics.cells);
  for (const Snapshot& s : r.snapshots) {
    CHECK(s.head.size() == cells);
    CHECK(s.water_content.size() == cells);
    for (std::size_t i = 0; i < cells; ++i) {
      CHECK(s.water_content[i] <= setup.soil.theta_s + 1e-12);
      CHECK(s.water_content[i] == Approx(setup.soil.water_content(s.head[i])).epsilon(1e-4));
    }
  }
  CHECK(r.drawing.cells.size() == cells);
  CHECK(r.snapshots[1].head[0] > 0.0);  // under the pond
  const Wetted& wetted = r.samples.back().wetted;
  CHECK(wetted.depth > r.samples.front().wetted.depth);
  CHECK(wetted.depth < r.statistics.domain_depth);
  CHECK(wetted.beyond_wall > 0.0);
}

TEST_CASE("a stopped test keeps what it has", "[solver]") {
  const TestSetup setup = loam_test();
  const Resolution fine = resolution(setup).scaled(0.6);
  const TestRun whole = run_test(setup, fine);
  REQUIRE(whole.statistics.domain_enlargements == 0);  // both ran in the same ground
  const TestRun part = run_test(setup, fine, [](double t) { return t < 2000.0; });
  CHECK(part.interrupted);
  CHECK_FALSE(whole.interrupted);
  REQUIRE(part.samples.size() >= 2);
  REQUIRE(part.samples.size() < 4);
  for (std::size_t i = 0; i < part.samples.size(); ++i)
    CHECK(part.samples[i].ring_volume == whole.samples[i].ring_volume);
}

TEST_CASE("a test that cannot go on says when, why and where", "[solver]") {
  const TestSetup setup = loam_test();
  Resolution hopeless = resolution(setup);
  hopeless.theta_tolerance = 1e-17;  // beyond the digits of a double
  bool failed = false;
  try {
    run_test(setup, hopeless);
  } catch (const SolverFailure& failure) {
    failed = true;
    CHECK(failure.time < setup.duration);
    CHECK(std::string(failure.what()).size() > 20);
    REQUIRE_FALSE(failure.worst.empty());
    for (const WorstCell& c : failure.worst) {
      CHECK(c.centre[0] > 0.0);
      CHECK(c.centre[1] < 0.0);
    }
  }
  CHECK(failed);
}

TEST_CASE("a deeper pond, a wider ring, a shallower wall: more water", "[solver]") {
  const TestSetup base = loam_test();
  const double usual = run(base).samples.back().ring_volume;
  TestSetup deeper = base, wider = base, shallower = base, wetter = base;
  deeper.pond_head = 0.15;
  wider.ring.radius = 0.15;
  shallower.ring.insertion = 0.02;
  wetter.initial_head = -0.6;
  CHECK(run(deeper).samples.back().ring_volume > 1.1 * usual);
  CHECK(run(wider).samples.back().ring_volume > 1.5 * usual);
  CHECK(run(shallower).samples.back().ring_volume > usual);
  CHECK(run(wetter).samples.back().ring_volume < usual);
}
