#include <catch2/catch.hpp>
#include <cmath>
#include <stdexcept>
#include <string>

#include "cases/input/read_case.hpp"

namespace ringwright::cases {
namespace {

Ground ground_of(const std::string& keys) {
  return read_case("ringwright: 1\nground:\n" + keys +
                       "tests:\n  a: { ring: 30 cm, insert: 10 cm, head: 5 cm }\n",
                   "x.yaml")
      .ground;
}

std::string errors_of(const std::string& keys) {
  try {
    ground_of(keys);
  } catch (const CaseErrors& errors) {
    return errors.what();
  }
  return "";
}

}  // namespace

TEST_CASE("a texture means one soil per published table") {
  const Ground both = ground_of("  texture: Silt Loam\n");
  REQUIRE(both.variants.size() == 2);
  const Ground one = ground_of("  texture: silt loam\n  published: Carsel & Parrish 1988\n");
  REQUIRE(one.variants.size() == 1);
  CHECK(one.variants[0].source == "Carsel & Parrish 1988");
  // Carsel & Parrish 1988, Water Resour. Res. 24:755, table 6: theta_s 0.45, theta_r 0.067,
  // Ks 10.8 cm/d.
  CHECK(one.variants[0].soil.theta_s == Approx(0.45));
  CHECK(one.variants[0].soil.theta_r == Approx(0.067));
  CHECK(one.variants[0].soil.Ks == Approx(0.108 / 86400).epsilon(0.01));
}

TEST_CASE("a given Kfs replaces the published one in every table") {
  const Ground ground = ground_of("  texture: silt loam\n  Kfs: 18 mm/h at 20 degC\n");
  for (const SoilVariant& variant : ground.variants) CHECK(variant.soil.Ks == Approx(5e-6));
}

TEST_CASE("a Kfs at another temperature is brought to 20 degC by the viscosity") {
  const Ground ground = ground_of("  texture: silt loam\n  Kfs: 18 mm/h at 0 degC\n");
  // Ratio of the viscosities at 0 and 20 degC: 1.789 (IAPWS release on liquid water at 0.1 MPa).
  CHECK(ground.variants[0].soil.Ks == Approx(5e-6 * 1.789).epsilon(1e-3));
}

TEST_CASE("a name is shown in place of the texture") {
  CHECK(ground_of("  name: upper terrace\n  texture: silt loam\n").variants[0].label ==
        "upper terrace");
}

TEST_CASE("a soil by van Genuchten's parameters") {
  const Ground ground = ground_of(
      "  parameters: { theta_r: 0.078, theta_s: 43 %, alpha: 0.036 1/cm, n: 1.56, Ks: 24.96 cm/d "
      "}\n"
      "  minimum capillary height: 0 cm\n");
  REQUIRE(ground.variants.size() == 1);
  const models::Soil& soil = ground.variants[0].soil;
  CHECK(soil.theta_s == Approx(0.43));
  CHECK(soil.Ks == Approx(0.2496 / 86400));
  // van Genuchten (1980), Soil Sci. Soc. Am. J. 44:892, eq. 3: at alpha |h| = 1, Se = 2^-m.
  CHECK(soil.curves->saturation(-1 / 3.6) == Approx(std::pow(2.0, -(1 - 1 / 1.56))));
  CHECK(soil.curves->entry_head() == 0.0);
  const Ground by_default = ground_of(
      "  parameters: { theta_r: 0.078, theta_s: 0.43, alpha: 3.6 1/m, n: 1.56 }\n  Kfs: 18 mm/h at "
      "20 degC\n");
  CHECK(by_default.variants[0].soil.curves->entry_head() == Approx(-0.02));
  CHECK(by_default.variants[0].soil.Ks == Approx(5e-6));
}

TEST_CASE("soils by Gardner's and by Brooks and Corey's parameters") {
  const Ground gardner = ground_of(
      "  parameters: { curve: Gardner, theta_r: 0.05, theta_s: 0.4, alpha: 0.12 1/cm, Ks: 10 mm/h "
      "}\n");
  // Gardner (1958), Soil Sci. 85:228: K = Ks exp(alpha h).
  CHECK(gardner.variants[0].soil.curves->relative_conductivity(-0.1) == Approx(std::exp(-1.2)));
  const Ground brooks_corey = ground_of(
      "  parameters: { curve: Brooks-Corey, theta_r: 0.05, theta_s: 0.4, entry head: -20 cm, "
      "lambda: 0.5, Ks: 10 mm/h }\n");
  // Brooks & Corey (1964), Hydrology Paper 3, Colorado State Univ.: Se = (h_b / h)^lambda.
  CHECK(brooks_corey.variants[0].soil.curves->saturation(-0.8) == Approx(0.5));
}

TEST_CASE("a soil by capillary length takes up the fillable porosity") {
  const Ground ground = ground_of(
      "  capillary length: 8 cm\n  fillable porosity: 25 %\n  Kfs: 18 mm/h at 20 degC\n  moisture: "
      "suction 20 cm\n");
  REQUIRE(ground.variants.size() == 1);
  const models::Soil& soil = ground.variants[0].soil;
  CHECK(soil.theta_s - soil.water_content(-0.2) == Approx(0.25));
  CHECK(soil.curves->relative_conductivity(-0.08) == Approx(std::exp(-1.0)));
  const Ground by_class =
      ground_of("  alpha star: structured\n  fillable porosity: 25 %\n  Kfs: 18 mm/h\n");
  CHECK(by_class.variants[0].soil.curves->relative_conductivity(-1.0 / 12) ==
        Approx(std::exp(-1.0)));
}

TEST_CASE("moisture by suction, content or degree of saturation") {
  const std::string parameters =
      "  parameters: { theta_r: 0.1, theta_s: 0.4, alpha: 2 1/m, n: 2, Ks: 10 mm/h }\n";
  const Ground suction = ground_of(parameters + "  moisture: suction 30 kPa\n");
  CHECK(initial_head(suction.moisture, suction.variants[0].soil) == Approx(-30000 / 9789.067));
  CHECK(suction.moisture.words == "suction 30 kPa");
  const Ground content = ground_of(parameters + "  moisture: content 25 %\n");
  // Se = 0.5 = (1 + (alpha |h|)^2)^-1/2 at alpha |h| = sqrt(3) (van Genuchten 1980, eq. 3).
  CHECK(initial_head(content.moisture, content.variants[0].soil) ==
        Approx(-std::sqrt(3.0) / 2).epsilon(1e-6));
  const Ground full = ground_of(parameters + "  moisture: 62.5 % full\n");
  CHECK(initial_head(full.moisture, full.variants[0].soil) ==
        Approx(-std::sqrt(3.0) / 2).epsilon(1e-6));
  const Moisture too_wet{"", {}, 0.41, {}};
  CHECK_THROWS_AS(initial_head(too_wet, full.variants[0].soil), std::invalid_argument);
}

TEST_CASE("moisture words are suctions") {
  for (const auto& [word, suction] : {std::pair{"dry", 30.0}, {"moist", 3.0}, {"wet", 0.6}}) {
    CHECK(ground_of("  texture: silt loam, " + std::string(word) + "\n").moisture.suction.value() ==
          Approx(suction));
  }
}

TEST_CASE("the minimum capillary height may be 0 from n = 1.3 only") {
  const auto with_n = [](const char* n, const char* height) {
    return errors_of(
        "  parameters: { theta_r: 0.1, theta_s: 0.4, alpha: 2 1/m, n: " + std::string(n) +
        ", Ks: 10 mm/h }\n  minimum capillary height: " + height + "\n");
  };
  CHECK(with_n("1.3", "0 cm").empty());
  CHECK(with_n("1.29", "0 cm").find("is refused for a soil of n = 1.29") != std::string::npos);
  CHECK(with_n("1.09", "-0.1 cm").empty());
  CHECK(with_n("1.5", "2 cm").find("allowed: -20 cm to 0 cm") != std::string::npos);
}

}  // namespace ringwright::cases
