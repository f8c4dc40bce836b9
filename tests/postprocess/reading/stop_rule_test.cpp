#include "postprocess/reading/stop_rule.hpp"

#include <catch2/catch.hpp>
#include <stdexcept>
#include <vector>

using namespace ringwright;
using models::StopKind;
using models::StopRule;
using postprocess::first_steady_reading;
using postprocess::first_stop;

namespace {

// Readings of one minute in a ring of 0.5 m2 with the given rates [m/s].
models::Record record_with(const std::vector<double>& rates) {
  models::Record record;
  record.ring_area = 0.5;
  double time = 0.0, total = 0.0;
  for (double rate : rates) {
    const double volume = rate * 0.5 * 60.0;
    time += 60.0, total += volume;
    record.readings.push_back({time, 60.0, volume, total, 0.05});
  }
  return record;
}

StopRule rule_of(StopKind kind, int readings = 3, double figure = 0.0) {
  StopRule rule;
  rule.kind = kind, rule.readings = readings;
  rule.share = rule.amount = rule.time = rule.volume = figure;
  return rule;
}

}  // namespace

TEST_CASE("the rule ends a test at the first reading whose last three agree", "[reading]") {
  // 6, 5, 4.9: mean 5.3, 13 % off; 5, 4.9, 5.1: mean 5, 2 % off
  const auto record = record_with({10, 6, 5, 4.9, 5.1, 5.0});
  REQUIRE(first_steady_reading(record, 3, 0.05));
  CHECK(*first_steady_reading(record, 3, 0.05) == 4);
}

TEST_CASE("agreement is with the mean of the readings, not between neighbours", "[reading]") {
  // each 4 % above the one before, the ends 3.9 % off the mean
  const auto drifting = record_with({1.00, 1.04, 1.08});
  CHECK(first_steady_reading(drifting, 3, 0.05));
  CHECK_FALSE(first_steady_reading(drifting, 3, 0.035));
}

TEST_CASE("a rate that crosses the band on its way does not end the test early", "[reading]") {
  const auto record = record_with({8, 4, 2, 1, 1, 1});
  CHECK(first_steady_reading(record, 3, 0.05) == 5);
  CHECK(first_steady_reading(record, 2, 0.05) == 4);
}

TEST_CASE("a rule that is never met gives no reading", "[reading]") {
  CHECK_FALSE(first_steady_reading(record_with({8, 4, 2, 1}), 3, 0.05));
}

TEST_CASE("fewer readings than the rule asks for give no reading", "[reading]") {
  CHECK_FALSE(first_steady_reading(record_with({1, 1}), 3, 0.05));
  CHECK_FALSE(first_steady_reading(record_with({}), 1, 0.05));
  CHECK(first_steady_reading(record_with({1, 1}), 2, 0.05) == 1);
}

TEST_CASE("a short last interval counts by its rate, not by its volume", "[reading]") {
  auto record = record_with({9, 5, 5});
  record.readings.push_back({190.0, 10.0, 5 * 0.5 * 10.0, 0.0, 0.05});
  CHECK(first_steady_reading(record, 3, 0.05) == 3);
}

// Below, all by hand: readings of one minute, 0.5 m2.

TEST_CASE("stop rules: a share asks what first_steady_reading asks", "[reading]") {
  const auto record = record_with({10, 6, 5, 4.9, 5.1, 5.0});
  CHECK(first_stop(record, rule_of(StopKind::change_within_share, 3, 0.05)) == 4);
  CHECK(first_stop(record, rule_of(StopKind::change_within_share, 2, 0.05)) == 3);
  CHECK_FALSE(first_stop(record, rule_of(StopKind::change_within_share, 3, 0.01)));
  CHECK_FALSE(first_stop(record, rule_of(StopKind::change_within_share, 7, 0.5)));
}

TEST_CASE("stop rules: an amount is the largest less the smallest of the last rates", "[reading]") {
  // neighbours differ by 0.3 at most from the third on, four of them by 0.7
  const auto record = record_with({9, 6, 5, 4.7, 4.5, 4.3, 4.3, 4.3});
  CHECK(first_stop(record, rule_of(StopKind::change_within_amount, 2, 0.31)) == 3);
  CHECK(first_stop(record, rule_of(StopKind::change_within_amount, 4, 0.71)) == 5);
  CHECK(first_stop(record, rule_of(StopKind::change_within_amount, 4, 0.31)) == 7);
  CHECK_FALSE(first_stop(record, rule_of(StopKind::change_within_amount, 4, 0.1)));
  // exactly the amount counts, also where rounding makes it a little more
  CHECK(first_stop(record_with({1.1, 1.0}), rule_of(StopKind::change_within_amount, 2, 0.1)) == 1);
  // it is no sum of changes: up and down is one change
  CHECK(first_stop(record_with({5, 4, 5, 4}), rule_of(StopKind::change_within_amount, 4, 1)) == 3);
}

TEST_CASE("stop rules: at a time, by the first reading not before it", "[reading]") {
  const auto record = record_with({5, 5, 5, 5});
  CHECK(first_stop(record, rule_of(StopKind::after_time, 1, 120)) == 1);
  CHECK(first_stop(record, rule_of(StopKind::after_time, 1, 121)) == 2);
  CHECK_FALSE(first_stop(record, rule_of(StopKind::after_time, 1, 241)));
}

TEST_CASE("stop rules: after a volume, of what went in since the first reading", "[reading]") {
  // 0.5 m2 x 60 s x 2 m/s = 60 m3 per reading
  const auto record = record_with({2, 2, 2, 2});
  CHECK(first_stop(record, rule_of(StopKind::after_volume, 1, 120)) == 1);
  CHECK(first_stop(record, rule_of(StopKind::after_volume, 1, 121)) == 2);
  CHECK_FALSE(first_stop(record, rule_of(StopKind::after_volume, 1, 241)));
}

TEST_CASE("stop rules: what a soak took is not counted", "[reading]") {
  // an hour and 500 m3 before the first reading that is kept
  auto record = record_with({2, 2, 2, 2});
  for (auto& r : record.readings) r.time += 3600, r.total_volume += 500;
  CHECK(first_stop(record, rule_of(StopKind::after_time, 1, 120)) == 1);
  CHECK(first_stop(record, rule_of(StopKind::after_volume, 1, 120)) == 1);
  CHECK_FALSE(first_stop(record, rule_of(StopKind::after_time, 1, 3600)));
}

TEST_CASE("stop rules: never across a change of head", "[reading]") {
  // The head changes at 120 s; the rates agree by chance across it.
  const auto record = record_with({8, 5, 5, 5, 5});
  const std::vector<double> starts{0.0, 120.0};
  for (const StopKind kind : {StopKind::change_within_share, StopKind::change_within_amount}) {
    const StopRule rule = rule_of(kind, 3, 0.01);
    CHECK(first_stop(record, rule) == 3);
    CHECK(first_stop(record, rule, starts) == 4);
    // two readings a stage are too few for three
    CHECK_FALSE(first_stop(record, rule, std::vector<double>{0.0, 120.0, 240.0}));
  }
  // a reading at the very start of a stage ends the stage before
  CHECK(first_stop(record_with({5, 5, 9, 9}), rule_of(StopKind::change_within_share, 2, 0.01),
                   starts) == 1);
  // time and volume run through
  CHECK(first_stop(record, rule_of(StopKind::after_time, 1, 240), starts) == 3);
}

TEST_CASE("stop rules: no readings, no stop", "[reading]") {
  CHECK_FALSE(first_stop(record_with({}), rule_of(StopKind::after_time, 1, 0.0)));
  CHECK_FALSE(first_stop(record_with({}), rule_of(StopKind::change_within_share, 1, 0.1)));
}

TEST_CASE("stop rules: impossible rules are refused", "[reading]") {
  const auto record = record_with({5, 5});
  CHECK_THROWS_AS(first_stop(record, rule_of(StopKind::change_within_share, 0, 0.1)),
                  std::invalid_argument);
  CHECK_THROWS_AS(first_stop(record, rule_of(StopKind::after_time, 1, -1.0)),
                  std::invalid_argument);
  CHECK_THROWS_AS(first_stop(record, rule_of(StopKind::change_within_amount, 2, -1.0)),
                  std::invalid_argument);
}
