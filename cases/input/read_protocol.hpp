#pragma once
/// How a test is run and read: keys that may stand in a test or beside all tests.

#include <optional>

#include "cases/input/case.hpp"
#include "cases/input/read_phrases.hpp"
#include "cases/input/section_reader.hpp"

namespace ringwright::cases {

/// What a section says of it, and where.
struct ProtocolWords {
  std::optional<StopWords> stop;
  std::optional<ReadWords> read;
  std::optional<double> assumed_alpha_star;  ///< [1/m]
  Place stop_place, read_place;
};

ProtocolWords read_protocol(const SectionReader& section, Reading& reading);

/// Fills the protocol of `test` from its own words, else the common ones, else the defaults, which
/// are listed as assumed; reports readings that do not fit into the test.
void apply_protocol(const SectionReader& section, const ProtocolWords& own,
                    const ProtocolWords& common, Test& test, Reading& reading);

}  // namespace ringwright::cases
