#pragma once
/// A test's own keys before those beside all tests.

#include <string_view>

#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

struct TestSection {
  const SectionReader& own;
  const SectionReader& common;

  bool has(std::string_view key) const { return own.has(key) || common.has(key); }
  /// The section that holds the key; the test's own if neither does.
  const SectionReader& with(std::string_view key) const {
    return !own.has(key) && common.has(key) ? common : own;
  }
};

}  // namespace ringwright::cases
