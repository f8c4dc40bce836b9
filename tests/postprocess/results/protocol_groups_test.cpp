#include <catch2/catch.hpp>
#include <cmath>

#include "postprocess/results/atomic_file.hpp"
#include "postprocess/results/fields_file.hpp"
#include "tests/postprocess/results/h5_reader.hpp"
#include "tests/postprocess/results/synthetic_answer.hpp"
#include "tests/postprocess/results/temporary_folder.hpp"

using namespace ringwright::postprocess;
using namespace ringwright::tests;

namespace {

using Doubles = std::vector<double>;
using Texts = std::vector<std::string>;

class Written {
 public:
  explicit Written(const Answer& answer) {
    write_atomically(folder_.path() / "fields.h5", fields_file(answer, synthetic_provenance()));
  }
  H5Reader reader() const { return H5Reader(folder_.path() / "fields.h5"); }

 private:
  TemporaryFolder folder_;
};

}  // namespace

TEST_CASE("stages, pairs, rules, flags and events come back from the file") {
  const Answer answer = eventful_answer();
  const Written written(answer);
  const H5Reader reader = written.reader();
  CHECK(reader.doubles("/stages/head_to") == Doubles{0.05, 0.15});
  CHECK(reader.doubles("/stages/rate") == Doubles{9e-6, 2e-5});
  CHECK(reader.ints("/stages/soak") == std::vector<int>{0, 1});
  CHECK(reader.ints("/stages/program_stage") == std::vector<int>{0, 1});
  CHECK(reader.doubles("/pairs/reads") == Doubles{1.0 / 3.0});
  CHECK(reader.ints("/pairs/second") == std::vector<int>{1});
  CHECK(reader.texts("/verdicts/kind") == Texts{"change within share", "after volume"});
  CHECK(reader.texts("/verdicts/name") == Texts{"", "six hours"});
  CHECK(reader.doubles("/verdicts/stop")[0] == 1200.0);
  CHECK(std::isnan(reader.doubles("/verdicts/stop")[1]));
  CHECK(reader.texts("/flags/kind") == Texts{"surfacing", "piping"});
  CHECK(reader.texts("/flags/limit_unit") == Texts{"s", "1"});
  CHECK(reader.doubles("/flags/place") == Doubles{0.25, 0.0});
  CHECK(reader.texts("/events/kind") == Texts{"reservoir empty", "refilled"});
  CHECK(reader.doubles("/events/time") == Doubles{300.0, 400.0});
}

TEST_CASE("the record as read and the water of the rings come back from the file") {
  const Answer answer = eventful_answer();
  const Written written(answer);
  const H5Reader reader = written.reader();
  CHECK(reader.doubles("/as_read/volume") ==
        Doubles{answer.as_read.readings[0].volume, answer.as_read.readings[1].volume});
  CHECK(reader.doubles("/as_read/rate") == Doubles{answer.as_read.rate(0), answer.as_read.rate(1)});
  CHECK(reader.doubles("/water/ring_supply") == Doubles{0.0098});
  CHECK(reader.doubles("/water/outer_ring_removed") == Doubles{0.001});
  CHECK(reader.doubles("/water/outer_ring_rate") == Doubles{1e-5});
  CHECK(reader.doubles("/figures/depth_of_influence") == Doubles{0.21});
  CHECK(reader.doubles("/figures/surfacing_volume") == Doubles{0.003});
}

TEST_CASE("each cell names its soil") {
  // The lower row of the six quads lies from 5 to 10 cm; the wall at 15 cm goes down to 10 cm, and
  // what is within 6 cm of it, by the cell's centre, is disturbed: the middle column.
  Answer answer = eventful_answer();
  auto& setup = answer.question.setup;
  setup.layers_below = {{0.05, setup.soil, -3.0, "below"}};
  CHECK(Written(answer).reader().ints("/fields/soil") == std::vector<int>{0, 0, 0, 1, 1, 1});
  setup.disturbed = {.width = 0.06, .factor = 0.5};
  // Two layers, then the same two disturbed.
  CHECK(Written(answer).reader().ints("/fields/soil") == std::vector<int>{0, 2, 0, 1, 3, 1});
}
