#include "postprocess/results/answer_json.hpp"

#include <catch2/catch.hpp>
#include <limits>

#include "postprocess/results/json_text.hpp"
#include "tests/postprocess/results/synthetic_answer.hpp"

using namespace ringwright::postprocess;
using namespace ringwright::tests;
using nlohmann::json;

namespace {

json written_and_read(const Answer& answer) { return json::parse(json_text(to_json(answer))); }

void check_same_bits(const json& found, const Figure& figure, const std::string& unit) {
  CHECK(found.at("value").get<double>() == figure.value);
  CHECK(found.at("error").get<double>() == figure.error);
  CHECK(found.at("unit") == unit);
}

/// Number of objects with a value; all of them must name a unit.
int quantities_with_unit(const json& node) {
  int count = 0;
  if (node.is_object() && node.contains("value")) {
    INFO(node.dump());
    REQUIRE(node.contains("unit"));
    ++count;
  }
  if (node.is_structured()) {
    for (const auto& child : node) count += quantities_with_unit(child);
  }
  return count;
}

}  // namespace

TEST_CASE("every figure comes back bit for bit, with error and unit") {
  const Answer answer = synthetic_answer();
  const json found = written_and_read(answer);
  for (std::size_t i = 0; i < answer.ladder.size(); ++i) {
    const auto& rung = answer.ladder[i];
    const auto& row = found.at("ladder").at(i);
    CHECK(row.at("time").at("value") == rung.time);
    CHECK(row.at("stops_here") == rung.stops_here);
    check_same_bits(row.at("rate"), rung.rate, "m/s");
    check_same_bits(row.at("soil_volume"), rung.soil_volume, "m3");
    check_same_bits(row.at("supply_volume"), rung.supply_volume, "m3");
    check_same_bits(row.at("above_steady"), rung.above_steady, "1");
    const auto& reads_x = row.at("reads_x");
    check_same_bits(reads_x.at("rate_as_kfs"), rung.reads.rate_as_kfs, "1");
    check_same_bits(reads_x.at("one_head"), rung.reads.one_head, "1");
    check_same_bits(reads_x.at("one_head_own_lambda"), rung.reads.one_head_own_lambda, "1");
  }
  check_same_bits(found.at("steady").at("rate"), answer.steady_rate, "m/s");
  check_same_bits(found.at("wetted_depth"), answer.wetted_depth, "m");
  check_same_bits(found.at("wetted_beyond_wall"), answer.wetted_beyond_wall, "m");
  CHECK(found.at("own_capillary_length").at("value") == answer.own_capillary_length);
  CHECK(found.at("steady").at("time_to_steady_beyond") == true);
  CHECK(found.at("question").at("soil").at("curves") == "named for a test");
}

TEST_CASE("the record comes back bit for bit") {
  const Answer answer = synthetic_answer();
  const json found = written_and_read(answer).at("record");
  CHECK(found.at("ring_area").at("value") == answer.record.ring_area);
  REQUIRE(found.at("readings").size() == 2);
  for (std::size_t i = 0; i < 2; ++i) {
    const auto& row = found.at("readings").at(i);
    CHECK(row.at("volume").at("value") == answer.record.readings[i].volume);
    CHECK(row.at("total_volume").at("value") == answer.record.readings[i].total_volume);
    CHECK(row.at("rate").at("value") == answer.record.rate(i));
  }
}

TEST_CASE("a reported Kfs is what it reads times the true one, at both temperatures") {
  Answer answer = synthetic_answer();
  answer.question.setup.soil.Ks = 2e-6;
  answer.question.viscosity_ratio = 1.25;
  answer.ladder[0].reads.one_head = {1.5, 0.25};
  const json row = written_and_read(answer).at("ladder").at(0);
  CHECK(row.at("reported_kfs").at("one_head").at("value").get<double>() == Approx(3e-6));
  CHECK(row.at("reported_kfs").at("one_head").at("error").get<double>() == Approx(0.5e-6));
  CHECK(row.at("reported_kfs_20degC").at("one_head").at("value").get<double>() == Approx(3.75e-6));
  CHECK(row.at("reported_kfs_20degC").at("one_head").at("error").get<double>() == Approx(0.625e-6));
}

TEST_CASE("no quantity is without unit") {
  const Answer answer = synthetic_answer();
  CHECK(quantities_with_unit(answer_document(answer, synthetic_provenance())) > 60);
}

TEST_CASE("what is not finite becomes null") {
  Answer answer = synthetic_answer();
  answer.steady_rate = {std::numeric_limits<double>::quiet_NaN(),
                        std::numeric_limits<double>::infinity()};
  const json found = written_and_read(answer).at("steady").at("rate");
  CHECK(found.at("value").is_null());
  CHECK(found.at("error").is_null());
}

TEST_CASE("a soil without curves and an empty answer are written too") {
  const json found = written_and_read(Answer{});
  CHECK(found.at("question").at("soil").at("curves").is_null());
  CHECK(found.at("ladder").empty());
}

TEST_CASE("text that is not UTF-8 does not stop the writing") {
  CHECK_NOTHROW(json::parse(json_text({{"text",
                                        "5 \xB0"
                                        "C"}})));
}
