#include "solver/mesh/grading.hpp"

#include <algorithm>
#include <catch2/catch.hpp>
#include <cmath>

using namespace ringwright::solver;
using Catch::WithinRel;

namespace {

double width(const std::vector<double>& edges, std::size_t i) {
  return std::abs(edges[i + 1] - edges[i]);
}

double steepest_growth(const std::vector<double>& edges) {
  double worst = 1.0;
  for (std::size_t i = 0; i + 2 < edges.size(); ++i) {
    const double g = width(edges, i + 1) / width(edges, i);
    worst = std::max({worst, g, 1.0 / g});
  }
  return worst;
}

bool in_order(const std::vector<double>& edges, bool ascending) {
  for (std::size_t i = 0; i + 1 < edges.size(); ++i)
    if ((edges[i + 1] > edges[i]) != ascending) return false;
  return true;
}

}  // namespace

TEST_CASE("grading from one end: first cell exact, growth bounded, ends exact", "[solver][mesh]") {
  for (double growth : {1.05, 1.2, 1.35, 1.6, 2.0})
    for (double length : {0.04, 0.13, 1.0, 40.0}) {
      const double first = 0.01;
      const std::vector<double> edges = graded_one_end(0.5, 0.5 + length, first, growth);
      CAPTURE(growth, length, edges.size());
      CHECK(edges.front() == 0.5);
      CHECK(edges.back() == 0.5 + length);
      CHECK(in_order(edges, true));
      CHECK_THAT(width(edges, 0), WithinRel(first, 1e-11));
      // the number of cells is whole, so cells may shrink, by one whole cell at most
      for (std::size_t i = 0; i + 2 < edges.size(); ++i)
        CHECK(width(edges, i + 1) <= growth * 1.001 * width(edges, i));
    }
}

TEST_CASE("grading from one end runs downwards too and makes one cell of a short stretch",
          "[solver][mesh]") {
  const std::vector<double> down = graded_one_end(0.0, -2.0, 0.05, 1.3);
  CHECK(in_order(down, false));
  CHECK_THAT(width(down, 0), WithinRel(0.05, 1e-11));
  CHECK(down.back() == -2.0);
  CHECK(graded_one_end(0.0, 0.012, 0.01, 1.3).size() == 2);
}

TEST_CASE("grading from one end: cells in geometric progression", "[solver][mesh]") {
  const std::vector<double> edges = graded_one_end(0.0, 5.0, 0.02, 1.25);
  const double q = width(edges, 1) / width(edges, 0);
  for (std::size_t i = 1; i + 2 < edges.size(); ++i)
    CHECK_THAT(width(edges, i + 1) / width(edges, i), WithinRel(q, 1e-7));
}

TEST_CASE("grading from both ends: both end cells exact, growth bounded", "[solver][mesh]") {
  for (double growth : {1.1, 1.35, 1.6})
    for (double last : {0.002, 0.01, 0.05})
      for (double length : {0.3, 1.0, 20.0}) {
        const std::vector<double> edges = graded_both_ends(0.0, -length, 0.01, last, growth);
        CAPTURE(growth, last, length, edges.size());
        CHECK(edges.front() == 0.0);
        CHECK(edges.back() == -length);
        CHECK(in_order(edges, false));
        CHECK_THAT(width(edges, 0), WithinRel(0.01, 1e-9));
        CHECK_THAT(width(edges, edges.size() - 2), WithinRel(last, 1e-9));
        // where there is room for the smaller cells to grow up to the larger end
        if (length > 0.01 + last + std::abs(last - 0.01) / (growth - 1))
          CHECK(steepest_growth(edges) <= growth * growth);
      }
}

TEST_CASE("grading from both ends of a stretch too short for both: equal cells", "[solver][mesh]") {
  const std::vector<double> edges = graded_both_ends(0.0, 0.05, 0.03, 0.02, 1.3);
  REQUIRE(edges.size() == 4);
  CHECK(steepest_growth(edges) == Approx(1.0));
}

TEST_CASE("grading from both ends leaves no sliver at any length", "[solver][mesh]") {
  const double first = 0.010, last = 0.006, growth = 1.35;
  for (int i = 0; i <= 400; ++i) {
    const double length = 0.004 + 0.0003 * i;
    const std::vector<double> edges = graded_both_ends(0.0, length, first, last, growth);
    CAPTURE(length, edges);
    CHECK(in_order(edges, true));
    for (std::size_t k = 0; k + 1 < edges.size(); ++k) CHECK(width(edges, k) >= 0.3 * last);
    CHECK(width(edges, 0) <= first * (1 + 1e-12));
    CHECK(width(edges, edges.size() - 2) <= last * (1 + 1e-12));
  }
}

TEST_CASE("centres of a geometric spacing are geometric means of the edges", "[solver][mesh]") {
  std::vector<double> edges;
  const double g = 1.4;
  for (int i = 0; i < 12; ++i) edges.push_back(std::pow(g, i));
  const std::vector<double> centres = graded_centres(edges);
  REQUIRE(centres.size() == 11);
  // The point the spacing grows away from is 0 here.
  for (std::size_t i = 1; i + 1 < centres.size(); ++i)
    CHECK_THAT(centres[i], WithinRel(std::sqrt(edges[i] * edges[i + 1]), 1e-12));
  CHECK_THAT(centres.front(), WithinRel(0.5 * (edges[0] + edges[1]), 1e-12));
  CHECK_THAT(centres.back(), WithinRel(0.5 * (edges[10] + edges[11]), 1e-12));
}

TEST_CASE("centres of equal cells are midpoints, of a mirrored spacing mirrored",
          "[solver][mesh]") {
  const std::vector<double> equal = graded_centres({0.0, 1.0, 2.0, 3.0});
  CHECK(equal == std::vector<double>{0.5, 1.5, 2.5});
  const std::vector<double> there = graded_centres({0.0, 1.0, 3.0, 7.0, 15.0});
  const std::vector<double> back = graded_centres({0.0, -1.0, -3.0, -7.0, -15.0});
  const std::vector<double> turned = graded_centres({-15.0, -7.0, -3.0, -1.0, 0.0});
  for (std::size_t i = 0; i < there.size(); ++i) {
    CHECK(back[i] == -there[i]);
    CHECK_THAT(turned[3 - i], WithinRel(-there[i], 1e-12));
  }
}
