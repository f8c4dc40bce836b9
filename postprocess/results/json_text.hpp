#pragma once
#include <nlohmann/json.hpp>
#include <string>

namespace ringwright::postprocess {

/// JSON as text, indented by two blanks, newline at the end. A value that holds nothing but plain
/// values stands on one line, and so does a row of a list that holds nothing deeper than those,
/// or a list with its unit:
/// long records would be mostly blanks otherwise. Numbers have as many digits as bring
/// back the same bits; numbers that are not finite become null; bytes that are not UTF-8 become
/// replacement characters.
std::string json_text(const nlohmann::json& document);

}  // namespace ringwright::postprocess
