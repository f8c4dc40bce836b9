/// Random ring tests: all complete, and what is printed about their error is true.
///
/// RINGWRIGHT_MATRIX=1500 in the environment makes the matrix larger.

#include <fmt/format.h>

#include <catch2/catch.hpp>
#include <cstdlib>
#include <exception>
#include <iostream>

#include "validation/random_matrix/figures.hpp"

using namespace ringwright;
using namespace ringwright::validation;

namespace {

std::uint64_t matrix_size() {
  const char* size = std::getenv("RINGWRIGHT_MATRIX");
  return size ? std::max<std::uint64_t>(300, std::strtoull(size, nullptr, 10)) : 300;
}

solver::TestRun run_at(const RandomCase& c, double accuracy) {
  const auto table = std::make_shared<solver::CurveTable>(c.setup.soil.curves);
  const solver::Resolution r =
      solver::resolution_for(c.setup, accuracy, table->capillary_length(), c.setup.times.front());
  return solver::run_test(c.setup, r, table);
}

// Volumes and flows that cannot be: below 0, shrinking, or not a number.
bool plausible(const solver::TestRun& run) {
  double before = 0.0;
  for (const solver::Sample& s : run.samples) {
    if (!(s.ring_volume > before) || !(s.ring_flow > 0.0)) return false;
    before = s.ring_volume;
  }
  return true;
}

void check_completes(const RandomCase& c) {
  CAPTURE(c.name);
  try {
    const solver::TestRun run = run_at(c, 0.01);
    CHECK(run.samples.size() == c.setup.times.size());
    CHECK(plausible(run));
    CHECK(run.statistics.balance_error <= 1e-5);
  } catch (const std::exception& failure) {
    FAIL_CHECK(failure.what());
  }
}

struct Tally {
  int cases = 0, within = 0, met = 0;
  std::vector<double> estimates, actual;
};

// Answers the case at 1 % and holds every promised figure against a finer run.
void judge(const RandomCase& c, double fine, Tally& tally) {
  ++tally.cases;
  try {
    const postprocess::Answer a = postprocess::answer(question_of(c, 0.01));
    const std::vector<ErrorPair> pairs = compare_with_finer(a, fine);
    tally.met += a.accuracy_met;
    tally.estimates.push_back(a.worst_relative_error);
    tally.actual.push_back(largest_actual(pairs));
    if (all_within(pairs))
      ++tally.within;
    else
      std::cout << fmt::format("{}: true {:.3f} %, estimated {:.3f} % at worst\n", c.name,
                               100 * tally.actual.back(), 100 * tally.estimates.back());
  } catch (const std::exception& failure) {
    CAPTURE(c.name);
    FAIL_CHECK(failure.what());
  }
}

void print(const std::string& title, const Tally& t) {
  std::cout << fmt::format(
      "{}: {} of {} within their printed error, accuracy met in {}; median estimate {:.3f} %, "
      "median true error {:.3f} %, largest {:.3f} %\n",
      title, t.within, t.cases, t.met, 100 * median(t.estimates), 100 * median(t.actual),
      100 * *std::max_element(t.actual.begin(), t.actual.end()));
}

}  // namespace

TEST_CASE("random matrix: every case completes and closes its balance", "[matrix][slow]") {
  for (std::uint64_t i = 0; i < matrix_size(); ++i)
    check_completes(random_case(i, models::published_soils()));
}

// Without a minimum capillary height dK/dh has no bound at saturation for n < 2.
TEST_CASE("random matrix: no minimum capillary height, n from 1.3", "[matrix][slow]") {
  std::vector<models::PublishedSoil> rows;
  for (const models::PublishedSoil& row : models::published_soils())
    if (row.n >= 1.3) rows.push_back(row);
  REQUIRE(rows.size() >= 12);
  for (std::uint64_t i = 0; i < 40; ++i) check_completes(random_case(5000 + i, rows, 0.0));
}

TEST_CASE("random matrix: every tenth case is right at a fifth of the accuracy", "[matrix][slow]") {
  Tally tally;
  // of each ten another one, so that all classes and both tables come
  for (std::uint64_t i = 0; i < matrix_size(); i += 10)
    judge(random_case(i + (i / 10) % 10, models::published_soils()), 0.002, tally);
  print("every tenth", tally);
  CHECK(tally.within >= 0.95 * tally.cases);
}

TEST_CASE("random matrix: the error printed is honest and not too cautious", "[matrix][slow]") {
  Tally tally;
  for (std::uint64_t i = 0; i < 100; ++i)
    judge(random_case(10000 + i, models::published_soils()), 0.001, tally);
  print("honesty", tally);
  CHECK(tally.within >= 95);
  CHECK(tally.met == tally.cases);
  CHECK(median(tally.estimates) <= 5 * median(tally.actual));
}
