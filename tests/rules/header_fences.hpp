#pragma once
/// Which outside headers may be included where.

#include <vector>

#include "tests/rules/source_tree.hpp"

namespace ringwright::rules {

/// Third-party and system headers outside the folders they are fenced into, and headers that no
/// fence names. Tests and validation may include what they check with.
std::vector<Violation> broken_fences(const SourceTree& tree);

/// Standard headers for clocks, threads, files, locale or printing in models and solver, whose code
/// must run anywhere and give the same bits every time.
std::vector<Violation> impure_floors(const SourceTree& tree);

}  // namespace ringwright::rules
