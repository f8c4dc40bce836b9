#pragma once
/// The form of single files.

#include <vector>

#include "tests/rules/source_tree.hpp"

namespace ringwright::rules {

/// Headers without `#pragma once`, and files of more than 400 lines.
std::vector<Violation> misshapen_files(const SourceTree& tree);

}  // namespace ringwright::rules
