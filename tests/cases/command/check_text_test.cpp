#include "cases/command/check_text.hpp"

#include <catch2/catch.hpp>
#include <string>

#include "cases/input/read_case.hpp"

namespace ringwright::cases {
namespace {

using Catch::Contains;

std::string text_of(const std::string& ground, const std::string& test) {
  return check_text(read_case("ringwright: 1\nground:\n" + ground + "tests:\n  a: { ring: 30 cm, " +
                                  "insert: 10 cm, " + test + " }\n",
                              "x.yaml"));
}

const std::string loam = "  texture: loam, moist\n";

}  // namespace

TEST_CASE("check shows the stages as they will run", "[check]") {
  const std::string text = text_of(
      loam, "heads: '15 cm then 5 cm, each for 20 min', soak: 5 cm for 30 min, step down: bail");
  CHECK_THAT(text, Contains("start to 30 min: soak at 5 cm, not read"));
  CHECK_THAT(text, Contains("30 min to 50 min: head 15 cm"));
  CHECK_THAT(text, Contains("50 min to 1 h 10 min: head 5 cm, bailed down"));
  // 0.0706858 m2, 15 cm deep.
  CHECK_THAT(text, Contains("holds 10.6 L"));
}

TEST_CASE("check shows outer ring, incident, supply and rules", "[check]") {
  const std::string text = text_of(
      loam,
      "outer ring: 60 cm, outer insert: 15 cm, head: 5 cm, supply: 6 L/min, reservoir: 50 L, "
      "when empty: refilled in 20 min, incident: outer ring empty from 1 h 10 min to 1 h 40 min, "
      "also judge: [four half-hour drops within a quarter inch]");
  CHECK_THAT(text, Contains("outer ring 60 cm (23.6 in) wide, 15 cm (5.91 in) into the ground"));
  CHECK_THAT(text, Contains("outer ring empty from 1 h 10 min to 1 h 40 min"));
  CHECK_THAT(text, Contains("supply at most 6.0 L/min, reservoir 50 L"));
  CHECK_THAT(text, Contains("check your edition"));
}

TEST_CASE("check shows the layers from the level of the test down, and warns", "[check]") {
  const std::string text = text_of(
      "  test level: 50 cm below ground\n  texture: loam\n  layers: clay loam from 1 m\n"
      "  water table: 3 m\n  disturbed: { width: 1 cm, Ks x: 0.3 }\n",
      "head: 5 cm, reservoir: 2 L");
  CHECK_THAT(text, Contains("from 50 cm below it: clay loam by Carsel & Parrish 1988"));
  CHECK_THAT(text, Contains("the test stands 50 cm below ground"));
  CHECK_THAT(text, Contains("water table 250 cm below the test"));
  CHECK_THAT(text, Contains("Ks x 0.3"));
  // 0.0706858 m2, 5 cm deep: 3.53 L.
  CHECK_THAT(text, Contains("Hardly meant") && Contains("2 L do not even fill the ring of a"));
}

}  // namespace ringwright::cases
