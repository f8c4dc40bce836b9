#include "cases/input/read_case.hpp"

#include <algorithm>
#include <catch2/catch.hpp>
#include <fstream>
#include <sstream>
#include <string>

namespace ringwright::cases {
namespace {

const std::string head = "ringwright: 1\n";
const std::string ground = "ground:\n  texture: silt loam, moist\n";
const std::string tests = "tests:\n  one head: { ring: 30 cm, insert: 10 cm, head: 5 cm }\n";

bool assumes(const Case& result, const std::string& key, const std::string& text) {
  return std::any_of(result.assumed.begin(), result.assumed.end(), [&](const Assumption& a) {
    return a.key == key && a.text.find(text) != std::string::npos;
  });
}

std::string errors_of(const std::string& text) {
  try {
    read_case(text, "x.yaml");
  } catch (const CaseErrors& errors) {
    return errors.what();
  }
  return "";
}

}  // namespace

TEST_CASE("the demo case reads in full") {
  const std::string path = std::string(RINGWRIGHT_SOURCE_DIR) + "/cases/examples/alderwick.yaml";
  std::ifstream file(path);
  std::stringstream text;
  text << file.rdbuf();
  const Case result = read_case(text.str(), path);
  CHECK(result.job == "Alderwick Township, 12 rain gardens");
  CHECK(result.text == text.str());
  CHECK(result.file == path);
  CHECK(result.ground.water_temperature == Approx(10));
  CHECK(result.ground.moisture.suction.value() == Approx(3.0));
  REQUIRE(result.ground.variants.size() == 2);
  CHECK(result.ground.variants[0].label == "silt loam");
  CHECK(result.ground.variants[0].source != result.ground.variants[1].source);
  REQUIRE(result.tests.size() == 1);
  const Test& test = result.tests[0];
  CHECK(test.name == "one head");
  CHECK(test.ring.radius == Approx(0.15));
  CHECK(test.ring.insertion == Approx(0.10));
  CHECK(test.wall_thickness == Approx(0.003));
  CHECK(test.assumed_alpha_star == Approx(12));
  CHECK(test.protocol.head == Approx(0.05));
  CHECK(test.protocol.longest == Approx(8 * 3600));
  CHECK(test.protocol.reading_interval.value() == Approx(600));
  REQUIRE(test.protocol.stop);
  CHECK(test.protocol.stop->readings == 3);
  CHECK(test.protocol.stop->within == Approx(0.05));
}

TEST_CASE("the wall of a ring on the surface counts and is assumed when not given") {
  const std::string on_surface = "tests:\n  one head: { ring: 30 cm, insert: 0 cm, head: 5 cm";
  const std::string ground = head + "ground:\n  texture: silt loam\n";
  CHECK(assumes(read_case(ground + on_surface + " }\n", "x.yaml"), "tests.one head.wall",
                "wall 3 mm"));
  const Case given = read_case(ground + on_surface + ", wall: 8 mm }\n", "x.yaml");
  CHECK(given.tests[0].ring.wall == Approx(0.008));
}

TEST_CASE("what is not given is assumed and listed") {
  const Case result = read_case(head + "ground:\n  texture: silt loam\n" + tests, "x.yaml");
  CHECK(result.accuracy == Approx(0.01));
  CHECK(assumes(result, "accuracy", "accuracy 1 %"));
  CHECK(assumes(result, "ground.water", "water 20 degC"));
  CHECK(assumes(result, "ground.moisture", "\"moist\" = suction 300 cm ("));
  CHECK(assumes(result, "ground.Kfs", "published Ks taken as Kfs"));
  CHECK(assumes(result, "ground.published", "published soils of"));
  CHECK(assumes(result, "ground.minimum capillary height", "minimum capillary height -2 cm"));
  CHECK(assumes(result, "ground.specific storage", "specific storage 0 1/m"));
  CHECK_FALSE(assumes(result, "tests.one head.wall", "wall 3 mm"));  // driven in: no effect
  CHECK(assumes(result, "tests.one head.stop", "stop = 3 readings within 5 %, or 8 h"));
  CHECK(assumes(result, "tests.one head.read", "read every 24 min"));
  CHECK(assumes(result, "tests.one head.read", "ruler 1 mm"));
  CHECK(assumes(result, "tests.one head.read", "head kept to 5 mm"));
  CHECK(assumes(result, "tests.one head.assumed alpha star", "alpha* 0.12 1/cm"));
  CHECK(result.tests[0].protocol.reading_interval.value() == Approx(0.05 * 8 * 3600));
}

TEST_CASE("what is given is not assumed") {
  const Case result =
      read_case(head +
                    "accuracy: 0.3 %\nground:\n  texture: silt loam, wet\n  water: 50 degF\n"
                    "  published: Carsel & Parrish 1988\n  Kfs: 18 mm/h at 20 degC\n"
                    "  minimum capillary height: -1 cm\n  specific storage: 1e-4 1/m\n"
                    "tests:\n  one head: { ring: 12\", insert: 0 cm, head: 0 cm, wall: 2 mm }\n"
                    "  stop: after 6 h\n  read: every 5 min, ruler to 2 mm, head kept to 1 cm\n"
                    "  assumed alpha star: fine\n  supply: 6 L/min\n  evaporation: 0 mm/d\n"
                    "  gauge: 10 mL\n  reading error: 0 mL\n",
                "x.yaml");
  CHECK(result.accuracy == Approx(0.003));
  CHECK(result.ground.water_temperature == Approx(10));
  REQUIRE(result.ground.variants.size() == 1);
  CHECK(result.ground.variants[0].soil.Ks == Approx(5e-6));
  CHECK(result.ground.variants[0].soil.specific_storage == Approx(1e-4));
  CHECK(result.ground.moisture.suction.value() == Approx(0.6));
  CHECK(result.tests[0].ring.radius == Approx(0.1524));
  CHECK(result.tests[0].assumed_alpha_star == Approx(4));
  CHECK_FALSE(result.tests[0].protocol.stop);
  CHECK(result.tests[0].protocol.longest == Approx(6 * 3600));
  CHECK(result.tests[0].ruler == Approx(0.002));
  CHECK(result.tests[0].head_kept == Approx(0.01));
  // Only the meaning of the moisture word is left to be told, and what no key speaks of.
  REQUIRE(result.assumed.size() == 4);
  CHECK(result.assumed[0].text.starts_with("\"wet\" = suction 60 cm ("));
  CHECK(assumes(result, "ground.layers", "the same soil all the way down"));
  CHECK(assumes(result, "ground.wall gap", "no gap"));
  CHECK(assumes(result, "tests.one head.ramp", "takes 5 s"));
}

TEST_CASE("words of a test go before those for all tests") {
  const Case result = read_case(head + ground +
                                    "tests:\n  a: { ring: 30 cm, insert: 10 cm, head: 5 cm }\n"
                                    "  b: { ring: 20 cm, insert: 5 cm, head: 5 cm, stop: 30 min }\n"
                                    "  stop: after 6 h\n",
                                "x.yaml");
  REQUIRE(result.tests.size() == 2);
  CHECK(result.tests[0].protocol.longest == Approx(6 * 3600));
  CHECK(result.tests[0].protocol.reading_interval.value() == Approx(18 * 60));
  CHECK(result.tests[1].protocol.longest == Approx(30 * 60));
  CHECK(result.tests[1].protocol.reading_interval.value() == Approx(90));
}

TEST_CASE("a test shorter than a minute is one reading") {
  const Case result = read_case(head + ground + tests + "  stop: after 40 s\n", "x.yaml");
  CHECK(result.tests[0].protocol.reading_interval.value() == Approx(40));
}

TEST_CASE("a stop rule without a limit ends after eight hours at the latest") {
  const Case result =
      read_case(head + ground + tests + "  stop: 4 readings within 10 %\n", "x.yaml");
  CHECK(result.tests[0].protocol.stop->readings == 4);
  CHECK(result.tests[0].protocol.stop->within == Approx(0.10));
  CHECK(result.tests[0].protocol.longest == Approx(8 * 3600));
  CHECK(assumes(result, "tests.one head.stop", "at most 8 h"));
}

TEST_CASE("the ends of a range are allowed, what lies beyond is not") {
  const auto ring = [](const char* size) {
    return errors_of(head + ground + "tests:\n  a: { ring: " + size +
                     ", insert: 0 cm, head: 5 cm, wall: 1 mm }\n");
  };
  CHECK(ring("2 cm").empty());
  CHECK(ring("4 m").empty());
  CHECK_FALSE(ring("1.99 cm").empty());
  CHECK_FALSE(ring("4.01 m").empty());
  const auto insert = [](const char* depth) {
    return errors_of(head + ground + "tests:\n  a: { ring: 30 cm, insert: " + depth +
                     ", head: 5 cm }\n");
  };
  CHECK(insert("0 cm").empty());
  CHECK(insert("0.5 cm").empty());
  CHECK(insert("5 mm").empty());
  CHECK(insert("1 m").empty());
  CHECK_FALSE(insert("0.49 cm").empty());
  CHECK_FALSE(insert("0.001 mm").empty());
  CHECK_FALSE(insert("101 cm").empty());
}

TEST_CASE("all errors are found in one reading") {
  const std::string text = errors_of("ringwright: 1\naccuracy: 10 %\n" + ground +
                                     "  water: 10 C\n" + tests + "  stop: never\n");
  CHECK(text.find("x.yaml:2:11: error: accuracy: 10 % is out of range") != std::string::npos);
  CHECK(text.find("x.yaml:5:10: error: ground.water: C alone") != std::string::npos);
  CHECK(text.find("x.yaml:8:9: error: tests.stop: 'never' is not a stop rule") !=
        std::string::npos);
}

TEST_CASE("lines may end as on any system") {
  CHECK(errors_of("ringwright: 1\r\nground:\r\n  texture: silt loam\r\ntests:\r\n"
                  "  a: { ring: 30 cm, insert: 10 cm, head: 5 cm }\r\n")
            .empty());
}

}  // namespace ringwright::cases
