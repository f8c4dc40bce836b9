#pragma once

namespace ringwright::validation {

/// Prints what a two-head test of four stages costs against a constant head of the same length,
/// and a double ring against its inner ring alone: runs at 1 % with tables made before, and
/// answers.
void print_staged_costs();

}  // namespace ringwright::validation
