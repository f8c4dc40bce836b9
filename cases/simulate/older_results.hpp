#pragma once
#include <filesystem>
#include <set>

namespace ringwright::cases {

/// Removes what an earlier run left in the result folder, so that no folder mixes two runs: files
/// that bear the names of results (record.csv, answer.json, fields.h5, fields.xdmf), are not among
/// those just written and lie where results lie, in the folder or at most two levels below; then
/// folders left empty. Other files stay. What cannot be removed is left.
/// @param written as returned by write_result_folder
void remove_older_results(const std::filesystem::path& folder,
                          const std::set<std::filesystem::path>& written);

}  // namespace ringwright::cases
