#include "cases/input/starter_case.hpp"

#include <catch2/catch.hpp>
#include <string>

#include "cases/input/read_case.hpp"

namespace ringwright::cases {
namespace {

// The starter with one commented key brought to life.
std::string with_key(const std::string& key) {
  std::string text = starter_case();
  const std::size_t at = text.find("# " + key + ":");
  REQUIRE(at != std::string::npos);
  return text.erase(at, 2);
}

}  // namespace

TEST_CASE("the starter file reads without errors") {
  const Case result = read_case(starter_case(), "new.yaml");
  CHECK(result.tests.size() == 1);
}

TEST_CASE("every commented key of the starter file reads when it is brought to life") {
  for (const char* key :
       {"accuracy", "Kfs", "published", "minimum capillary height", "wall", "height",
        "assumed alpha star", "test level", "layers", "wall gap", "disturbed", "outer ring", "soak",
        "also judge", "gauge", "supply", "reservoir", "evaporation"}) {
    INFO(key);
    CHECK_NOTHROW(read_case(with_key(key), "new.yaml"));
  }
}

}  // namespace ringwright::cases
