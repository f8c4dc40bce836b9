/// 500 random tests of every kind: all complete, all keep their water, and every tenth is right.

#include <fmt/format.h>

#include <algorithm>
#include <array>
#include <catch2/catch.hpp>
#include <cmath>
#include <cstdlib>
#include <iostream>
#include <string>
#include <vector>

#include "solver/failure.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "validation/staged_matrix/staged_case.hpp"

using namespace ringwright;
using namespace ringwright::validation;

namespace {

constexpr double kBalance = 1e-5;

solver::TestRun run_at(const StagedCase& c, double accuracy) {
  const solver::CurveTable table(c.setup.soil.curves);
  return solver::run_test(
      c.setup,
      solver::resolution_for(c.setup, accuracy, table.capillary_length(), 0.05 * c.setup.duration));
}

struct Tally {
  std::vector<double> steps;
  double worst_balance = 0.0;
  std::string worst_name;
};

double quantile(std::vector<double> v, double share) {
  std::sort(v.begin(), v.end());
  return v[static_cast<std::size_t>(share * static_cast<double>(v.size() - 1))];
}

}  // namespace

TEST_CASE("500 random tests of every kind complete and keep their water", "[staged][slow]") {
  const char* more = std::getenv("RINGWRIGHT_STAGED_CASES");
  const long cases = more ? std::strtol(more, nullptr, 10) : 500;
  std::array<Tally, kDoings> tally;
  for (long k = 0; k < cases; ++k) {
    const StagedCase c = staged_case(static_cast<std::uint64_t>(k));
    CAPTURE(c.name);
    try {
      const solver::TestRun run = run_at(c, 0.01);
      Tally& t = tally[static_cast<std::size_t>(c.doing)];
      t.steps.push_back(static_cast<double>(run.statistics.steps));
      if (run.statistics.balance_error > t.worst_balance)
        t.worst_balance = run.statistics.balance_error, t.worst_name = c.name;
      CHECK(run.statistics.balance_error <= kBalance);
      CHECK(run.samples.size() == c.setup.times.size());
      const double most = run.samples.back().water.supply + run.samples.back().outer_water.supply;
      for (const solver::Sample& s : run.samples)
        for (const solver::RingWater& w : {s.water, s.outer_water})
          CHECK(std::abs(w.supply - w.soil - w.standing - w.evaporated - w.removed) <=
                kBalance * most);
    } catch (const solver::SolverFailure& failure) {
      FAIL_CHECK(c.name << " failed at " << failure.time << " s: " << failure.what());
    }
  }
  const char* names[] = {"steps of head", "falls", "weak supply", "reservoir", "double ring"};
  for (int d = 0; d < kDoings; ++d) {
    const Tally& t = tally[static_cast<std::size_t>(d)];
    std::cout << fmt::format(
        "{}: {} tests, time steps median {:.0f}, nine in ten below {:.0f}, most {:.0f}; worst "
        "balance {:.1e} ({})\n",
        names[d], t.steps.size(), quantile(t.steps, 0.5), quantile(t.steps, 0.9),
        quantile(t.steps, 1.0), t.worst_balance, t.worst_name);
  }
}
