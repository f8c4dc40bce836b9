#include "cases/simulate/stages_csv.hpp"

#include <algorithm>
#include <catch2/catch.hpp>
#include <string>

#include "cases/simulate/ladder_csv.hpp"
#include "tests/cases/simulate/synthetic_protocols.hpp"

namespace {

using namespace ringwright;
using Catch::Contains;

TEST_CASE("stages and the pairs they end are rows of a table", "[screen]") {
  const std::string table = cases::stages_csv(test::two_head_simulation());
  const std::string front = R"("two heads","silt loam","First & Table 1901",)";
  // 40 over 32 and 70 over 56 are a quarter above steady.
  CHECK_THAT(table, Contains("\n" + front + "1,yes,0,0.5,5,5,,,1,,,,,,\n"));
  CHECK_THAT(table, Contains("\n" + front + "2,,0.5,1.5,5,5,40,41,3,0.25,,,,,\n"));
  CHECK_THAT(table, Contains("\n" + front + "3,,1.5,2.5,20,20,70,63,5,0.25,2,21,1.5,28,yes\n"));
}

TEST_CASE("all rows of the stages have as many cells as the header", "[screen]") {
  const std::string table = cases::stages_csv(test::two_head_simulation());
  const auto commas = [&](std::size_t from) {
    const std::string line = table.substr(from, table.find('\n', from) - from);
    return std::count(line.begin(), line.end(), ',');
  };
  for (std::size_t at = 0; (at = table.find('\n', at) + 1) < table.size();)
    CHECK(commas(at) == commas(0));
}

TEST_CASE("a table is printed for what there is", "[screen]") {
  const auto plain = test::simulation_of(1);
  auto staged = test::two_head_simulation();
  CHECK(cases::tables_csv(plain) == cases::ladder_csv(plain));
  CHECK(cases::tables_csv(staged) == cases::stages_csv(staged));
  staged.tests.insert(staged.tests.begin(), plain.tests.front());
  CHECK(cases::tables_csv(staged) == cases::ladder_csv(staged) + "\n" + cases::stages_csv(staged));
}

}  // namespace
