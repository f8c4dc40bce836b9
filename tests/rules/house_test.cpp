/// The rules of the house, applied to this repository. A failure lists file, line and rule.
#include <catch2/catch.hpp>

#include "tests/rules/file_form.hpp"
#include "tests/rules/header_fences.hpp"
#include "tests/rules/include_direction.hpp"
#include "tests/rules/source_tree.hpp"

using namespace ringwright::rules;

namespace {
const SourceTree& house() {
  static const SourceTree tree = read_tree(RINGWRIGHT_SOURCE_DIR);
  return tree;
}
}  // namespace

TEST_CASE("the tree is read at all", "[rules]") {
  CHECK(house().contains("models/soil/curves.hpp"));
  CHECK(house().contains("tests/rules/house_test.cpp"));
  CHECK(house().at("tests/rules/house_test.cpp").includes.size() == 5);
}

TEST_CASE("floors include downwards only", "[rules]") {
  CHECK(listing(upward_includes(house())) == "");
}

TEST_CASE("includes are written from the root", "[rules]") {
  CHECK(listing(includes_not_from_root(house())) == "");
}

TEST_CASE("no include cycle", "[rules]") { CHECK(listing(include_cycles(house())) == ""); }

TEST_CASE("outside headers stay in their fences", "[rules]") {
  CHECK(listing(broken_fences(house())) == "");
}

TEST_CASE("models and solver hold no clocks, threads, files, locale or printing", "[rules]") {
  CHECK(listing(impure_floors(house())) == "");
}

TEST_CASE("headers have #pragma once and files end within 400 lines", "[rules]") {
  CHECK(listing(misshapen_files(house())) == "");
}
