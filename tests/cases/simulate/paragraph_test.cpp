#include "cases/simulate/paragraph.hpp"

#include <catch2/catch.hpp>

namespace {

using ringwright::cases::paragraph;
using ringwright::cases::screen_width;

TEST_CASE("short text stays on a line", "[screen]") {
  CHECK(paragraph("two  words ", "  ", "    ") == "  two words\n");
  CHECK(paragraph("", "  ", "    ").empty());
}

TEST_CASE("lines are as long as they may be", "[screen]") {
  const std::string fits(screen_width - 2, 'x');
  CHECK(paragraph(fits + " y", "  ", "    ") == "  " + fits + "\n    y\n");
  const std::string less(screen_width - 4, 'x');
  CHECK(paragraph(less + " y", "  ", "    ") == "  " + less + " y\n");
  // Two bytes, one place.
  CHECK(paragraph(less + " \xC3\xBC", "  ", "    ") == "  " + less + " \xC3\xBC\n");
}

TEST_CASE("a number keeps its unit", "[screen]") {
  const std::string before(screen_width - 5, 'x');
  CHECK(paragraph(before + " 62 cm deep", "", " ") == before + "\n 62 cm deep\n");
}

}  // namespace
