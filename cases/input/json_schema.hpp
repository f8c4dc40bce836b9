#pragma once
/// The grammar as a JSON Schema, with which editors complete and check case files.

#include <string>

namespace ringwright::cases {

/// Draft-07 schema of the case file, made from case_file_grammar(), indented, newline at the end.
/// cases/input/ringwright.schema.json is a copy; a test keeps the two equal.
std::string case_file_json_schema();

}  // namespace ringwright::cases
