#include <catch2/catch.hpp>
#include <thread>

#include "postprocess/reading/answer_question.hpp"
#include "solver/flow/curve_table.hpp"
#include "tests/postprocess/reading/answer_bits.hpp"
#include "tests/postprocess/reading/ring_question.hpp"
#include "tests/postprocess/reading/staged_question.hpp"

using namespace ringwright;
using namespace ringwright::postprocess;

TEST_CASE("companion runs side by side give the bits of one after the other",
          "[reading][threads]") {
  for (const char* texture : {"sandy loam", "silt"}) {
    Question q = ring_question(texture);
    q.setup.duration = 3600.0;
    const auto one = bits_of(answer(q));
    q.threads = 2;
    CAPTURE(texture);
    CHECK(bits_of(answer(q)) == one);
  }
}

TEST_CASE("stages and two rings give the same bits with one thread and with two",
          "[reading][threads]") {
  for (Question q : {two_head_question(), double_ring_question()}) {
    const auto one = bits_of(answer(q));
    q.threads = 2;
    CHECK(bits_of(answer(q)) == one);
  }
}

TEST_CASE("two answers in two threads give the bits of one after the other", "[reading][threads]") {
  const Question sand = ring_question("sandy loam"), silt = ring_question("silt");
  const auto sand_alone = bits_of(answer(sand)), silt_alone = bits_of(answer(silt));
  SECTION("two different questions") {
    std::vector<std::uint64_t> a, b;
    {
      std::jthread first([&] { a = bits_of(answer(sand)); });
      std::jthread second([&] { b = bits_of(answer(silt)); });
    }
    CHECK(a == sand_alone);
    CHECK(b == silt_alone);
  }
  SECTION("the same question twice, sharing a table") {
    const auto table = std::make_shared<solver::CurveTable>(sand.setup.soil.curves);
    std::vector<std::uint64_t> a, b;
    {
      std::jthread first([&] { a = bits_of(answer(sand, {}, table)); });
      std::jthread second([&] { b = bits_of(answer(sand, {}, table)); });
    }
    CHECK(a == sand_alone);
    CHECK(b == sand_alone);
  }
}
