#pragma once
/// Includes among our own files: downwards only, from the root, no cycle.

#include <vector>

#include "tests/rules/source_tree.hpp"

namespace ringwright::rules {

/// Includes of a higher floor, and of tests or validation from elsewhere.
/// Floors from the ground up: models, solver, postprocess, cases.
std::vector<Violation> upward_includes(const SourceTree& tree);

/// Quoted includes that are not the path of a file of the tree, written from the root.
std::vector<Violation> includes_not_from_root(const SourceTree& tree);

/// Files that include themselves over others; one violation per cycle found.
std::vector<Violation> include_cycles(const SourceTree& tree);

}  // namespace ringwright::rules
