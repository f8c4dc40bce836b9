#include "cases/simulate/progress.hpp"

#include <catch2/catch.hpp>
#include <nlohmann/json.hpp>
#include <sstream>

namespace {

using namespace ringwright::cases;

// A clock that is set by hand.
struct Watch {
  double now = 100.0;
  Progress::Clock clock() {
    return [this] { return now; };
  }
};

TEST_CASE("time to go in proportion to what is done", "[progress]") {
  CHECK_FALSE(seconds_to_go(0.0, 10.0));
  CHECK_FALSE(seconds_to_go(0.01, 10.0));
  CHECK(*seconds_to_go(0.25, 10.0) == Approx(30.0));
  CHECK(*seconds_to_go(1.0, 10.0) == 0.0);
}

TEST_CASE("lines are told now and then", "[progress]") {
  Watch watch;
  std::ostringstream stream;
  Progress progress(ProgressStyle::lines, stream, false, watch.clock());
  watch.now += 1.0;
  progress.tell(0.1);
  CHECK(stream.str().empty());
  watch.now += 9.0;
  progress.tell(0.25);
  progress.tell(0.26);
  CHECK(stream.str() == "25 % done after 10.0 s, about 30 s to go\n");
}

TEST_CASE("JSON lines say what is done, and the end", "[progress]") {
  Watch watch;
  std::ostringstream stream;
  Progress progress(ProgressStyle::json, stream, false, watch.clock());
  watch.now += 10.0;
  progress.tell(0.25);
  progress.tell(1.0);
  std::istringstream lines(stream.str());
  std::string first, last, more;
  std::getline(lines, first);
  std::getline(lines, last);
  CHECK(nlohmann::json::parse(first) ==
        nlohmann::json{{"done", 0.25}, {"elapsed_s", 10.0}, {"to_go_s", 30.0}});
  CHECK(nlohmann::json::parse(last)["done"] == 1.0);
  CHECK_FALSE(std::getline(lines, more));
}

TEST_CASE("a bar is drawn where a line can be redrawn, and wiped", "[progress]") {
  Watch watch;
  std::ostringstream stream;
  {
    Progress progress(ProgressStyle::automatic, stream, true, watch.clock());
    watch.now += 10.0;
    progress.tell(0.5);
    CHECK(stream.str().rfind("\r[===============               ]  50 %  about 10.0 s to go", 0) ==
          0);
  }
  CHECK(stream.str().back() == '\r');
}

TEST_CASE("automatic progress redraws nothing where it cannot", "[progress]") {
  Watch watch;
  std::ostringstream stream;
  {
    Progress progress(ProgressStyle::automatic, stream, false, watch.clock());
    watch.now += 10.0;
    progress.tell(0.5);
  }
  CHECK(stream.str().find('\r') == std::string::npos);
  CHECK_FALSE(stream.str().empty());
}

TEST_CASE("no progress says nothing", "[progress]") {
  Watch watch;
  std::ostringstream stream;
  {
    Progress progress(ProgressStyle::none, stream, true, watch.clock());
    watch.now += 100.0;
    progress.tell(0.5);
    progress.tell(1.0);
  }
  CHECK(stream.str().empty());
  CHECK_FALSE(progress_style("loud"));
  CHECK(progress_style("auto") == ProgressStyle::automatic);
}

}  // namespace
