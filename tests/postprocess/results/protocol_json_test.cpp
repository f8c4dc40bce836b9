#include <catch2/catch.hpp>
#include <limits>

#include "postprocess/results/answer_json.hpp"
#include "postprocess/results/json_text.hpp"
#include "tests/postprocess/results/synthetic_answer.hpp"

using namespace ringwright::postprocess;
using namespace ringwright::tests;
using nlohmann::json;

namespace {

json written_and_read(const Answer& answer) { return json::parse(json_text(to_json(answer))); }

void check(const json& found, double value, const char* unit) {
  CHECK(found.at("value").get<double>() == value);
  CHECK(found.at("unit") == unit);
}

void check(const json& found, const Figure& figure, const char* unit) {
  check(found, figure.value, unit);
  CHECK(found.at("error").get<double>() == figure.error);
}

}  // namespace

TEST_CASE("stages and pairs come back bit for bit") {
  const Answer answer = eventful_answer();
  const json found = written_and_read(answer);
  REQUIRE(found.at("stages").size() == 2);
  const json& stage = found.at("stages").at(1);
  CHECK(stage.at("stage") == 1);
  CHECK(stage.at("soak") == true);
  check(stage.at("from"), 600.0, "s");
  check(stage.at("to"), 1200.0, "s");
  check(stage.at("head_from"), 0.15, "m");
  check(stage.at("rate"), answer.stages[1].rate, "m/s");
  check(stage.at("rate_as_read"), 2.2e-5, "m/s");
  check(stage.at("soil_volume"), answer.stages[1].soil_volume, "m3");
  check(stage.at("steady_rate"), answer.stages[1].steady_rate, "m/s");
  const json& pair = found.at("pairs").at(0);
  check(pair.at("kfs"), answer.pairs[0].kfs, "m/s");
  check(pair.at("reads_x"), answer.pairs[0].reads, "1");
  check(pair.at("kfs_as_read"), 4e-6, "m/s");
  CHECK(pair.at("physical") == true);
  CHECK(pair.at("physical_as_read") == false);
}

TEST_CASE("the record as read stands beside the true one") {
  const Answer answer = eventful_answer();
  const json found = written_and_read(answer);
  const json& read = found.at("as_read");
  CHECK(read.at("volume").at("unit") == "m3");
  CHECK(read.at("rate").at("unit") == "m/s");
  for (std::size_t i = 0; i < 2; ++i) {
    CHECK(read.at("time").at("values").at(i) == answer.as_read.readings[i].time);
    CHECK(read.at("volume").at("values").at(i) == answer.as_read.readings[i].volume);
    CHECK(read.at("rate").at("values").at(i) == answer.as_read.rate(i));
    CHECK(read.at("head").at("values").at(i) == answer.as_read.readings[i].head);
    check(found.at("record").at("readings").at(i).at("volume"), answer.record.readings[i].volume,
          "m3");
  }
}

TEST_CASE("rules, flags and events are named") {
  const json found = written_and_read(eventful_answer());
  const json& met = found.at("verdicts").at(0);
  CHECK(met.at("met") == true);
  check(met.at("stop"), 1200.0, "s");
  const json& missed = found.at("verdicts").at(1);
  CHECK(missed.at("rule").at("kind") == "after volume");
  CHECK(missed.at("rule").at("name") == "six hours");
  CHECK(missed.at("stop").is_null());
  const json& flag = found.at("flags").at(0);
  CHECK(flag.at("kind") == "surfacing");
  check(flag.at("value"), 0.002, "m3");
  check(flag.at("limit"), 2700.0, "s");
  check(flag.at("place"), 0.25, "m");
  CHECK(found.at("flags").at(1).at("outer") == true);
  const json& event = found.at("events").at(0);
  CHECK(event.at("kind") == "reservoir empty");
  check(event.at("time"), 300.0, "s");
  check(event.at("value"), 0.02, "m3");
}

TEST_CASE("the water of both rings is told, and of one where there is one") {
  Answer answer = eventful_answer();
  json found = written_and_read(answer);
  check(found.at("water").at("supply"), answer.water.supply, "m3");
  check(found.at("outer_water").at("evaporated"), 0.002, "m3");
  check(found.at("outer_ring").at("rate"), answer.outer->rate, "m/s");
  check(found.at("surfacing").at("volume"), 0.003, "m3");
  check(found.at("depth_of_influence"), 0.21, "m");
  CHECK(found.at("ended_early") == true);
  answer.outer_water.reset();
  answer.outer.reset();
  answer.influence.known = false;
  found = written_and_read(answer);
  CHECK(found.at("outer_water").is_null());
  CHECK(found.at("outer_ring").is_null());
  CHECK(found.at("depth_of_influence").is_null());
}

TEST_CASE("the true Kfs is the one the question names") {
  Answer answer = eventful_answer();
  answer.question.true_Kfs = 3e-7;
  check(written_and_read(answer).at("truth").at("kfs"), 3e-7, "m/s");
}

TEST_CASE("a long list has one line per row, and reads back the same") {
  const json row = {{"time", {{"value", 1.0}, {"unit", "s"}}}, {"mark", true}};
  const json document = {{"column", {{"unit", "s"}, {"values", {1, 2, 3}}}},
                         {"readings", {row, row}},
                         {"deep", {{"a", {{"b", {{"c", 1}}}}}}}};
  const std::string text = json_text(document);
  CHECK(json::parse(text) == document);
  CHECK(text == R"({
  "column": {"unit":"s","values":[1,2,3]},
  "deep": {
    "a": {
      "b": {"c":1}
    }
  },
  "readings": [
    {"mark":true,"time":{"unit":"s","value":1.0}},
    {"mark":true,"time":{"unit":"s","value":1.0}}
  ]
}
)");
}
