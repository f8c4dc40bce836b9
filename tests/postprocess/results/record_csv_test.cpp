#include "postprocess/results/record_csv.hpp"

#include <catch2/catch.hpp>
#include <sstream>
#include <string>
#include <vector>

#include "tests/postprocess/results/synthetic_answer.hpp"

using namespace ringwright::postprocess;
using namespace ringwright::tests;

namespace {

using Cells = std::vector<std::string>;

std::vector<Cells> table_of(const std::string& text) {
  std::vector<Cells> table;
  std::istringstream lines(text);
  for (std::string line; std::getline(lines, line);) {
    table.emplace_back();
    std::istringstream cells(line);
    for (std::string cell; std::getline(cells, cell, ',');) table.back().push_back(cell);
  }
  return table;
}

double number(const std::string& cell) {
  std::size_t used = 0;
  const double value = std::stod(cell, &used);
  REQUIRE(used == cell.size());
  return value;
}

}  // namespace

TEST_CASE("the record comes back from its table") {
  const Answer answer = eventful_answer();
  const auto table = table_of(record_csv(answer));
  REQUIRE(table.size() == 3);
  CHECK(table[0] == Cells{"time_h", "interval_s", "volume_mL", "total_volume_L", "supply_L",
                          "rate_mm_per_h", "head_cm", "as_read_volume_mL", "as_read_rate_mm_per_h",
                          "as_read_head_cm"});
  for (std::size_t i = 0; i < 2; ++i) {
    const auto& reading = answer.record.readings[i];
    const auto& row = table[i + 1];
    REQUIRE(row.size() == 10);
    // Twelve digits are promised: half a unit of the twelfth, at worst 5e-12 relative.
    const auto is = [](double value) { return Approx(value).epsilon(5e-12).margin(0.0); };
    CHECK(number(row[0]) * 3600.0 == is(reading.time));
    CHECK(number(row[1]) == is(reading.interval));
    CHECK(number(row[2]) / 1e6 == is(reading.volume));
    CHECK(number(row[3]) / 1e3 == is(reading.total_volume));
    CHECK(number(row[4]) / 1e3 == is(reading.total_volume + answer.filling_volume));
    CHECK(number(row[5]) / 3.6e6 == is(answer.record.rate(i)));
    CHECK(number(row[6]) / 100.0 == is(reading.head));
    CHECK(number(row[7]) / 1e6 == is(answer.as_read.readings[i].volume));
    CHECK(number(row[8]) / 3.6e6 == is(answer.as_read.rate(i)));
    CHECK(number(row[9]) / 100.0 == is(answer.as_read.readings[i].head));
  }
}

TEST_CASE("a record without readings is a header") {
  Answer answer = synthetic_answer();
  answer.record.readings.clear();
  CHECK(table_of(record_csv(answer)).size() == 1);
}

TEST_CASE("the change of unit leaves no digits of its own") {
  Answer answer = synthetic_answer();
  answer.record.readings = {{1080.0, 60.0, 5e-5, 7e-5, 0.07}};
  CHECK(record_csv(answer).find("\n0.3,60,50,0.07,") != std::string::npos);
}

TEST_CASE("a record that was not read through a gauge has empty cells for it") {
  const auto text = record_csv(synthetic_answer());
  CHECK(text.find("5,,,\n") != std::string::npos);
}

TEST_CASE("where the ring has a program the supply is what it gave") {
  Answer answer = eventful_answer();
  answer.question.setup.program.stages.resize(2);
  answer.run.samples[0].water.supply = 0.0123;  // at 600 s, as the first reading
  CHECK(number(table_of(record_csv(answer))[1][4]) == Approx(12.3));
}
