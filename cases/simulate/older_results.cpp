#include "cases/simulate/older_results.hpp"

#include <algorithm>
#include <array>
#include <string_view>
#include <system_error>
#include <vector>

namespace ringwright::cases {
namespace {

namespace fs = std::filesystem;

constexpr int kDeepest = 2;  // test / source / file
constexpr std::array<std::string_view, 5> kNames = {"record.csv", "answer.json", "fields.h5",
                                                    "fields.xdmf", "stages.csv"};

bool is_result(const fs::directory_entry& entry) {
  const std::string name = entry.path().filename().string();
  return entry.is_regular_file() && !entry.is_symlink() &&
         std::find(kNames.begin(), kNames.end(), name) != kNames.end();
}

}  // namespace

void remove_older_results(const fs::path& folder, const std::set<fs::path>& written) {
  std::error_code error;
  std::vector<fs::path> older, folders;
  for (auto it = fs::recursive_directory_iterator(folder, error);
       !error && it != fs::recursive_directory_iterator(); it.increment(error)) {
    if (it.depth() >= kDeepest) it.disable_recursion_pending();
    if (is_result(*it) && !written.contains(it->path())) {
      older.push_back(it->path());
      if (it.depth() > 0) folders.push_back(it->path().parent_path());
      if (it.depth() > 1) folders.push_back(it->path().parent_path().parent_path());
    }
  }
  for (const fs::path& path : older) fs::remove(path, error);
  // the deeper first; a folder that still holds something stays
  std::sort(folders.rbegin(), folders.rend());
  for (const fs::path& path : folders)
    if (fs::is_directory(path, error) && fs::is_empty(path, error)) fs::remove(path, error);
}

}  // namespace ringwright::cases
