#pragma once
/// A case file from text to SI: the only way a case comes into being.
///
/// The text is read once as a located tree (located_yaml.hpp) and then section by section
/// against the grammar (schema.hpp). Nothing stops at the first error: all that can be found is
/// found, and thrown together with places. What is not given gets its default and is listed in
/// Case::assumed, so that no default is silent.
///
/// Example:
///   const Case c = read_case(text, "garden.yaml");   // throws CaseErrors

#include <filesystem>
#include <string>

#include "cases/input/case.hpp"
#include "cases/input/diagnostic.hpp"

namespace ringwright::cases {

/// The case in `text`.
/// @param file its name, for errors and provenance
/// @throws CaseErrors listing everything wrong
Case read_case(const std::string& text, const std::filesystem::path& file);

/// The same for a text composed from flags: errors name the flag behind each line.
Case read_case(const Source& source);

}  // namespace ringwright::cases
