#include "models/soil/catalogue.hpp"

#include <catch2/catch.hpp>

using namespace ringwright::models;

namespace {

constexpr double kCmPerDay = 0.01 / 86400;
constexpr double kCmPerHour = 0.01 / 3600;

const PublishedSoil& row(std::string_view texture, std::string_view source) {
  for (const PublishedSoil& candidate : published_soils()) {
    if (candidate.texture == texture && candidate.source == source) return candidate;
  }
  throw std::runtime_error("no such row");
}

}  // namespace

TEST_CASE("published soils: twelve classes of two tables", "[soil]") {
  CHECK(published_soils().size() == 24);
  CHECK(texture_classes().size() == 12);
  CHECK(texture_classes().front() == "sand");
  CHECK(texture_classes().back() == "clay");
  for (const auto texture : texture_classes()) {
    const auto rows = published_soils_of(texture);
    REQUIRE(rows.size() == 2);
    CHECK(rows[0].source == "Carsel & Parrish 1988");
    CHECK(rows[1].source == "Schaap et al. 2001");
  }
  CHECK(published_soils_of("gravel").empty());
}

TEST_CASE("published soils: Ks of every class as printed in cm/h", "[soil]") {
  // Carsel & Parrish 1988, Water Resour. Res. 24:755, means of Ks [cm/h], two decimals.
  const double printed[] = {29.70, 14.59, 4.42, 1.04, 0.25, 0.45,
                            1.31,  0.26,  0.07, 0.12, 0.02, 0.20};
  int i = 0;
  for (const auto texture : texture_classes()) {
    INFO(texture);
    CHECK(row(texture, "Carsel & Parrish 1988").Ks ==
          Approx(printed[i++] * kCmPerHour).margin(0.005 * kCmPerHour));
  }
}

TEST_CASE("published soils: rows of both tables", "[soil]") {
  // Carsel & Parrish 1988, Water Resour. Res. 24:755, class means.
  const PublishedSoil loam = row("loam", "Carsel & Parrish 1988");
  CHECK(loam.theta_r == 0.078);
  CHECK(loam.theta_s == 0.43);
  CHECK(loam.alpha == Approx(3.6));
  CHECK(loam.n == 1.56);
  CHECK(loam.Ks == Approx(24.96 * kCmPerDay));
  const PublishedSoil clay = row("clay", "Carsel & Parrish 1988");
  CHECK(clay.alpha == Approx(0.8));
  CHECK(clay.n == 1.09);
  CHECK(clay.Ks == Approx(4.8 * kCmPerDay));
  // Schaap, Leij & van Genuchten 2001, J. Hydrol. 251:163, class averages. The column of Ks is
  // log10, not ln: sand 10^2.808 = 643 cm/d.
  const PublishedSoil sand = row("sand", "Schaap et al. 2001");
  CHECK(sand.Ks == Approx(643 * kCmPerDay).epsilon(1e-3));
  CHECK(sand.alpha == Approx(3.52).epsilon(2e-3));  // 10^-1.453 = 0.0352 per cm
  CHECK(sand.n == Approx(3.18).epsilon(2e-3));      // 10^0.502
  CHECK(sand.theta_r == 0.053);
  const PublishedSoil silt = row("silt", "Schaap et al. 2001");
  CHECK(silt.theta_s == 0.489);
  CHECK(silt.n == Approx(1.679).epsilon(1e-3));  // 10^0.225
}

TEST_CASE("published soils: minimum capillary height", "[soil]") {
  // The rule: 2 cm where n < 2 (Vogel, van Genuchten & Cislerova 2001, Adv. Water Resour. 24:133).
  CHECK(default_minimum_capillary_height(1.999) == -0.02);
  CHECK(default_minimum_capillary_height(2.0) == 0.0);
  const PublishedSoil loam = row("loam", "Carsel & Parrish 1988");
  CHECK(make_soil(loam).curves->entry_head() == -0.02);
  CHECK(make_soil(loam, 0.0).curves->entry_head() == 0.0);
  CHECK(make_soil(loam, -0.05).curves->entry_head() == -0.05);
  CHECK(make_soil(row("sand", "Carsel & Parrish 1988")).curves->entry_head() == 0.0);
  CHECK(make_soil(loam).Ks == loam.Ks);
  CHECK(make_soil(loam).specific_storage == 0.0);
}
