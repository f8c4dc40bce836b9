#include "solver/virtual_test.hpp"

#include <cmath>
#include <stdexcept>

#include "solver/domain.hpp"
#include "solver/flow/curve_table.hpp"
#include "solver/ground_materials.hpp"
#include "solver/test_attempt.hpp"

namespace ringwright::solver {
namespace {

constexpr int kMostEnlargements = 4;

}  // namespace

Resolution Resolution::coarser() const {
  if (splits > 0) {
    Resolution r = *this;
    --r.splits;
    return r;
  }
  return scaled(2.0);
}

Resolution Resolution::scaled(double share) const {
  Resolution r = *this;
  r.tip_cell *= share;
  r.top_cell *= share;
  r.growth = std::pow(growth, share);
  r.growth_down = std::pow(growth_down, share);
  r.growth_inside = std::pow(growth_inside, share);
  return r;
}

TestRun run_test(const TestSetup& setup, const Resolution& resolution,
                 const std::vector<Material>& materials, const StepObserver& observer) {
  const CurveTable& top = *materials.front().table;
  if (head_before(setup, 0, 0.0) >= top.entry())
    throw std::invalid_argument("the soil is saturated before the test: there is nothing to fill");
  Domain domain = transient_domain(setup, top.capillary_length());
  for (int enlargements = 0;; ++enlargements) {
    TestAttempt attempt(setup, resolution, domain, materials);
    TestRun run = attempt.run(observer);
    run.statistics.domain_enlargements = enlargements;
    const bool enough = run.interrupted || attempt.domain_was_large_enough();
    run.statistics.domain_reached = !enough;
    if (enough || enlargements == kMostEnlargements) return run;
    domain.radius *= 1.5;
    domain.depth *= 1.5;
  }
}

TestRun run_test(const TestSetup& setup, const Resolution& resolution,
                 std::shared_ptr<const CurveTable> table, const StepObserver& observer) {
  return run_test(setup, resolution, ground_materials(setup, std::move(table)), observer);
}

TestRun run_test(const TestSetup& setup, const Resolution& resolution,
                 const StepObserver& observer) {
  return run_test(setup, resolution, ground_materials(setup), observer);
}

}  // namespace ringwright::solver
