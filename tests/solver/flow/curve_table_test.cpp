#include "solver/flow/curve_table.hpp"

#include <catch2/catch.hpp>
#include <cmath>
#include <random>
#include <string>
#include <vector>

#include "models/soil/brooks_corey.hpp"
#include "models/soil/catalogue.hpp"
#include "models/soil/durner.hpp"
#include "models/soil/gardner.hpp"

using namespace ringwright;
using namespace ringwright::solver;

namespace {

using CurvesPointer = std::shared_ptr<const models::Curves>;

std::vector<CurvesPointer> all_curves() {
  std::vector<CurvesPointer> all;
  for (const models::PublishedSoil& row : models::published_soils())
    for (double h_s : {0.0, -0.02}) all.push_back(models::make_soil(row, h_s).curves);
  for (double alpha : {1.0, 5.0, 36.0}) all.push_back(std::make_shared<models::Gardner>(alpha));
  all.push_back(std::make_shared<models::BrooksCorey>(-0.0726, 0.592));
  all.push_back(std::make_shared<models::BrooksCorey>(-0.373, 0.131));
  return all;
}

// A table ends with a chord over the last 0.1 mm of suction where the entry head is 0.
constexpr double kLastStretch = 1e-4;

std::vector<double> random_heads(const models::Curves& curves, int count, unsigned seed) {
  std::mt19937 generator(seed);
  std::uniform_real_distribution<double> logarithm(std::log10(kLastStretch), 3.0);
  std::vector<double> heads;
  while (static_cast<int>(heads.size()) < count) {
    const double h = -std::pow(10.0, logarithm(generator));
    if (h < curves.entry_head() && curves.saturation(h) > 1e-8) heads.push_back(h);
  }
  return heads;
}

}  // namespace

TEST_CASE("curve tables: positive and monotone for every soil", "[solver][flow]") {
  for (const CurvesPointer& curves : all_curves()) {
    const CurveTable table(curves);
    CAPTURE(curves->describe());
    const double dry = table.driest(), end = table.entry() + 0.01;
    // From the driest state on, finely on a logarithmic scale, and evenly near saturation.
    std::vector<double> points;
    for (int i = 0; i < 3000; ++i)
      points.push_back(dry + (table.switch_point() - dry) * std::pow(10.0, -9.0 + 9e-3 / 3 * i));
    for (int i = 0; i <= 3000; ++i)
      points.push_back(table.switch_point() + (end - table.switch_point()) * i / 3000);
    CurvePoint before = table.at(points.front());
    bool positive = true, monotone = true, sloped = true;
    for (double u : points) {
      const CurvePoint p = table.at(u);
      positive =
          positive && p.Se > 0 && p.Phi > 0 && p.K > 0 && p.Se <= 1 + 1e-12 && p.K <= 1 + 1e-12;
      monotone =
          monotone && p.Se >= before.Se - 1e-15 && p.Phi >= before.Phi && p.K >= before.K - 1e-15;
      sloped = sloped && p.dSe >= 0 && p.dPhi > 0 && p.dK >= 0;
      before = p;
    }
    CHECK(positive);
    CHECK(monotone);
    CHECK(sloped);
  }
}

TEST_CASE("curve tables agree with the closed forms", "[solver][flow]") {
  for (const CurvesPointer& curves : all_curves()) {
    const CurveTable table(curves);
    CAPTURE(curves->describe());
    double worst_K = 0.0, worst_Se = 0.0, worst_Phi = 0.0;
    for (double h : random_heads(*curves, 60, 11)) {
      const CurvePoint p = table.at(table.u_of_head(h));
      worst_K = std::max(worst_K, std::abs(p.K / curves->relative_conductivity(h) - 1));
      worst_Se = std::max(worst_Se, std::abs(p.Se / curves->saturation(h) - 1));
      worst_Phi = std::max(worst_Phi, std::abs(p.Phi / curves->relative_flux_potential(h) - 1));
    }
    CHECK(worst_K < 1e-5);
    CHECK(worst_Se < 1e-5);
    CHECK(worst_Phi < 1e-5);
  }
}

TEST_CASE("curve tables: head, unknown and potential there and back", "[solver][flow]") {
  for (const CurvesPointer& curves : all_curves()) {
    const CurveTable table(curves);
    CAPTURE(curves->describe());
    for (double h : random_heads(*curves, 40, 5)) {
      const double u = table.u_of_head(h);
      CAPTURE(h, u);
      CHECK(table.head_of_u(u) == Approx(h).epsilon(1e-6));
      const double Phi = table.at(u).Phi;
      const double back = table.u_of_potential(Phi);
      CHECK(table.at(back).Phi == Approx(Phi).epsilon(1e-10));
      // the potential fixes u to what its own digits allow
      CHECK(back == Approx(u).margin(1e-12 + 1e-12 * Phi / table.at(u).dPhi).epsilon(1e-9));
      CHECK(table.potential_of_head(h) == Approx(Phi).epsilon(1e-14));
    }
    for (double h : {0.0, 0.05, 3.0}) {
      CHECK(table.head_of_u(table.u_of_head(h)) == h);
      CHECK(table.u_of_potential(table.potential_of_head(h)) == Approx(h).margin(1e-14));
    }
  }
}

TEST_CASE("curve tables: slopes against differences", "[solver][flow]") {
  for (const CurvesPointer& curves : all_curves()) {
    const CurveTable table(curves);
    CAPTURE(curves->describe());
    for (double h : random_heads(*curves, 40, 23)) {
      const double u = table.u_of_head(h);
      const double room = std::min(u - table.driest(), std::abs(table.entry() - u));
      const double e = 1e-4 * room;
      if (std::abs(u - table.switch_point()) < 2 * e) continue;
      const CurvePoint l = table.at(u - e), r = table.at(u + e), p = table.at(u);
      const double rounding = 1e-15 / e;
      CAPTURE(h, u, e);
      CHECK(p.dSe == Approx((r.Se - l.Se) / (2 * e)).epsilon(1e-4).margin(rounding));
      CHECK(p.dPhi == Approx((r.Phi - l.Phi) / (2 * e)).epsilon(1e-4));
      CHECK(p.dK == Approx((r.K - l.K) / (2 * e)).epsilon(1e-4).margin(rounding));
    }
  }
}

TEST_CASE("curve tables: value and potential pass the switch and the entry head without a jump",
          "[solver][flow]") {
  for (const CurvesPointer& curves : all_curves()) {
    const CurveTable table(curves);
    CAPTURE(curves->describe());
    for (double u : {table.switch_point(), table.entry()}) {
      const double e = 1e-10;
      const CurvePoint l = table.at(u - e), r = table.at(u + e);
      CAPTURE(u);
      CHECK(l.Se == Approx(r.Se).epsilon(1e-6));
      CHECK(l.Phi == Approx(r.Phi).epsilon(1e-7));
      CHECK(l.K == Approx(r.K).epsilon(2e-5));  // a chord of the steepest: slope 1e5 per m
    }
    const CurvePoint wet = table.at(table.entry() + 0.25);
    CHECK(wet.Se == 1.0);
    CHECK(wet.K == 1.0);
    CHECK((wet.dSe == 0.0 && wet.dK == 0.0 && wet.dPhi == 1.0));
    CHECK(wet.Phi - table.at(table.entry()).Phi == Approx(0.25).epsilon(1e-12));
    CHECK(table.at(table.entry()).Se == 1.0);
    CHECK(table.at(table.entry()).K == 1.0);
  }
}

// Gardner 1958: the potential of exp(alpha h) is exp(alpha h)/alpha, the capillary length 1/alpha.
// Brooks & Corey after Mualem: |h_b| L eta / (L eta - 1) with eta = 2.5 + 2/L.
TEST_CASE("curve tables: capillary length of the curves that have it in closed form",
          "[solver][flow]") {
  const CurveTable gardner(std::make_shared<models::Gardner>(12.0));
  CHECK(gardner.capillary_length() == Approx(1.0 / 12.0).epsilon(1e-6));
  const CurveTable brooks(std::make_shared<models::BrooksCorey>(-0.2, 0.4));
  const double L_eta = 0.4 * 2.5 + 2.0;
  CHECK(brooks.capillary_length() == Approx(0.2 * L_eta / (L_eta - 1)).epsilon(1e-6));
}

TEST_CASE("curve tables: the driest state lies beyond every head", "[solver][flow]") {
  for (const CurvesPointer& curves : all_curves()) {
    const CurveTable table(curves);
    CAPTURE(curves->describe());
    CHECK(table.u_of_saturation(0.0) == Approx(table.driest()).epsilon(1e-14));
    for (double h : {-10.0, -1e3, -1e5}) {
      const CurvePoint p = table.at(table.u_of_head(h));
      CHECK(p.Phi >= 0.0);
      CHECK(p.K >= 0.0);
      CHECK(std::isfinite(p.dPhi));
      CHECK(std::isfinite(p.dK));
    }
  }
}

TEST_CASE("curve tables: soils of several pore systems agree with their curves", "[solver][flow]") {
  using Systems = std::vector<models::PoreSystem>;
  const std::vector<Systems> soils = {
      {{0.4, 20.0, 2.1}, {0.6, 0.5, 1.4}},
      {{0.08, 200.0, 3.0}, {0.92, 3.6, 1.56}},
      {{0.02, 300.0, 2.0}, {0.98, 1.0, 1.2}},
      {{0.002, 100.0, 3.0}, {0.998, 1.0, 3.0}},
      {{0.5, 4.0, 1.8}, {0.5, 3.0, 1.7}},
      {{0.1, 200.0, 3.0}, {0.6, 3.6, 1.56}, {0.3, 0.4, 1.8}},
      {{0.05, 500.0, 3.0}, {0.95, 1.0, 2.0}},
      {{0.02, 100.0, 5.0}, {0.98, 0.5, 3.0}},
      {{0.2, 100.0, 5.0}, {0.8, 0.2, 5.0}},
      {{0.3, 10.0, 1.2}, {0.7, 0.5, 1.1}},
  };
  for (const Systems& systems : soils) {
    for (double h_s : {0.0, -0.02}) {
      const auto curves = std::make_shared<models::Durner>(systems, 0.5, h_s);
      const CurveTable table(curves);
      CAPTURE(curves->describe(), table.bins());
      double worst_K = 0.0, worst_Se = 0.0, worst_Phi = 0.0, worst_head = 0.0;
      for (double h : random_heads(*curves, 400, 31)) {
        const double u = table.u_of_head(h);
        const CurvePoint p = table.at(u);
        worst_K = std::max(worst_K, std::abs(p.K / curves->relative_conductivity(h) - 1));
        worst_Se = std::max(worst_Se, std::abs(p.Se / curves->saturation(h) - 1));
        worst_Phi = std::max(worst_Phi, std::abs(p.Phi / curves->relative_flux_potential(h) - 1));
        worst_head = std::max(worst_head, std::abs(table.head_of_u(u) / h - 1));
        CAPTURE(h);
        CHECK((p.dSe >= 0 && p.dPhi > 0 && p.dK >= 0));
      }
      CHECK(worst_K < 1e-5);
      CHECK(worst_Se < 1e-5);
      CHECK(worst_Phi < 1e-5);
      CHECK(worst_head < 1e-6);
    }
  }
}
