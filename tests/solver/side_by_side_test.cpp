#include <catch2/catch.hpp>
#include <cstring>
#include <thread>
#include <vector>

#include "solver/flow/curve_table.hpp"
#include "solver/resolution.hpp"
#include "solver/virtual_test.hpp"
#include "tests/solver/soils.hpp"

using namespace ringwright;
using namespace ringwright::solver;

TEST_CASE("runs side by side give the bits of runs one after the other", "[solver][threads]") {
  std::vector<TestSetup> setups;
  std::vector<std::shared_ptr<const CurveTable>> tables;
  for (const char* texture : {"sand", "loam", "silt", "clay"}) {
    TestSetup s;
    s.soil = class_soil(texture);
    s.initial_head = -3.0;
    s.ring = {0.10, 0.05, 0.003};
    s.pond_head = 0.05;
    s.duration = 3600.0;
    s.times = {300.0, 3600.0};
    s.snapshots = {3600.0};
    setups.push_back(s);
    tables.push_back(std::make_shared<CurveTable>(s.soil.curves));
  }
  const auto answer = [&](std::size_t i, std::shared_ptr<const CurveTable> table) {
    const Resolution r = resolution_for(setups[i], 0.01, table->capillary_length(), 300.0);
    return run_test(setups[i], r, std::move(table));
  };
  const auto equal = [](const TestRun& a, const TestRun& b) {
    return a.samples.size() == b.samples.size() && !a.samples.empty() &&
           std::memcmp(a.samples.data(), b.samples.data(), a.samples.size() * sizeof(Sample)) ==
               0 &&
           a.snapshots[0].head == b.snapshots[0].head;
  };
  std::vector<TestRun> alone;
  for (std::size_t i = 0; i < setups.size(); ++i) alone.push_back(answer(i, tables[i]));

  SECTION("four different tests") {
    std::vector<TestRun> together(4);
    {
      std::vector<std::jthread> threads;
      for (std::size_t i = 0; i < 4; ++i)
        threads.emplace_back([&, i] { together[i] = answer(i, tables[i]); });
    }
    for (std::size_t i = 0; i < 4; ++i) CHECK(equal(alone[i], together[i]));
  }
  SECTION("the same test four times, sharing one table") {
    std::vector<TestRun> together(4);
    {
      std::vector<std::jthread> threads;
      for (std::size_t i = 0; i < 4; ++i)
        threads.emplace_back([&, i] { together[i] = answer(1, tables[1]); });
    }
    for (const TestRun& r : together) CHECK(equal(alone[1], r));
  }
}
