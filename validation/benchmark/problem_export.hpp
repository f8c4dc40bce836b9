#pragma once
#include <string>

#include "validation/benchmark/benchmark_case.hpp"

namespace ringwright::validation {

/// The semi-discrete problem that run_test() integrates in time, as JSON in SI units, for another
/// program to integrate: cells, faces, conditions, soil, initial head, times, reference rows, our
/// own volumes and those with the tolerance in time tightened until it no longer matters.
/// The soil must be of the van Genuchten family.
std::string problem_json(const BenchmarkCase& c, double accuracy);

}  // namespace ringwright::validation
