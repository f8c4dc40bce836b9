#pragma once
#include <vector>

namespace ringwright::solver {

/// Compressed sparse columns with a symmetric pattern; the values belong to the user.
struct SparsePattern {
  std::vector<int> column_starts;  ///< size n + 1
  std::vector<int> rows;           ///< ascending in each column
  std::vector<int> diagonal;       ///< position of entry (i, i)
};

}  // namespace ringwright::solver
