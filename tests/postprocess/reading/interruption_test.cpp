#include <algorithm>
#include <catch2/catch.hpp>

#include "postprocess/reading/answer_question.hpp"
#include "tests/postprocess/reading/answer_bits.hpp"
#include "tests/postprocess/reading/ring_question.hpp"

using namespace ringwright;
using namespace ringwright::postprocess;

namespace {

// What is left of an interrupted answer is the beginning of the whole one.
void check_beginning_of(const Answer& part, const Answer& whole) {
  REQUIRE(part.run.samples.size() <= whole.run.samples.size());
  REQUIRE(part.record.readings.size() <= whole.record.readings.size());
  for (std::size_t i = 0; i < part.record.readings.size(); ++i) {
    CHECK(part.record.readings[i].time == whole.record.readings[i].time);
    CHECK(part.record.readings[i].total_volume ==
          Approx(whole.record.readings[i].total_volume).epsilon(0.01));
  }
}

// A question whose first set of runs is not accurate enough.
Question question_with_refinement() {
  for (const char* texture : {"clay", "silty clay", "silt", "loam", "sandy loam", "sand"})
    for (double accuracy : {0.01, 0.003}) {
      Question q = ring_question(texture);
      q.accuracy = accuracy;
      const Answer a = answer(q);
      // a larger domain would begin the progress anew too
      if (a.refinements > 0 && a.run.statistics.domain_enlargements == 0) return q;
    }
  FAIL("no question needs a refinement");
  return {};
}

}  // namespace

TEST_CASE("an answer interrupted in its first set of runs keeps the readings so far", "[reading]") {
  Question q = sandy_loam_question();
  q.stop_readings = 0;
  const Answer whole = answer(q);
  for (int threads : {1, 2})
    for (double limit : {0.0, 0.06, 0.12, 0.25, 0.4}) {
      q.threads = threads;
      Answer part;
      CAPTURE(threads, limit);
      REQUIRE_NOTHROW(part = answer(q, [limit](double f) { return f < limit; }));
      CHECK(part.interrupted);
      CHECK_FALSE(part.accuracy_met);
      CHECK(part.run.interrupted);
      CHECK(part.ladder.empty());
      check_beginning_of(part, whole);
      if (limit == 0.4) CHECK(part.record.readings.size() > 5);
      CHECK(part.record.readings.size() < whole.record.readings.size());
    }
}

TEST_CASE("interrupted while it runs on to steady, all other figures stand", "[reading]") {
  Question q = sandy_loam_question();
  const Answer whole = answer(q);
  for (int threads : {1, 2}) {
    q.threads = threads;
    CAPTURE(threads);
    const Answer part = answer(q, [](double f) { return f < 0.9; });
    CHECK(part.interrupted);
    CHECK(part.accuracy_met);
    REQUIRE(part.ladder.size() == whole.ladder.size());
    CHECK(part.ladder.back().rate.value == whole.ladder.back().rate.value);
    CHECK(part.wetted_depth.value == whole.wetted_depth.value);
  }
}

TEST_CASE("the progress told never falls", "[reading]") {
  const Question q = question_with_refinement();
  double last = 0.0;
  answer(q, [&](double f) {
    CHECK(f >= last);
    last = f;
    return true;
  });
  CHECK(last == 1.0);
}

TEST_CASE("interrupted in the cheap run before, it stops at once", "[reading]") {
  const Question q = sandy_loam_question();  // with a stop rule: a run to find the stop comes first
  int calls = 0;
  Answer part;
  REQUIRE_NOTHROW(part = answer(q, [&](double) { return ++calls < 5; }));
  CHECK(part.interrupted);
  CHECK(part.record.readings.empty());
  CHECK(calls < 10);
}

TEST_CASE("interrupted in a refinement, the complete set before it is the answer", "[reading]") {
  Question q = question_with_refinement();
  for (int threads : {1, 2}) {
    q.threads = threads;
    // the first set ends below a half of the progress, the second begins there
    const auto stop_in_second_set = [](double f) { return f < 0.5; };
    Answer part;
    CAPTURE(threads);
    REQUIRE_NOTHROW(part = answer(q, stop_in_second_set));
    CHECK(part.interrupted);
    CHECK_FALSE(part.accuracy_met);
    CHECK(part.worst_relative_error > q.accuracy);
    CHECK_FALSE(part.run.interrupted);
    CHECK(part.run.samples.back().time == Approx(q.setup.duration));
    REQUIRE_FALSE(part.ladder.empty());
    CHECK(part.record.readings.back().time > 0.0);
    CHECK(part.steady_rate.value > 0.0);
    CHECK(part.peak_flow > 0.0);
  }
}
