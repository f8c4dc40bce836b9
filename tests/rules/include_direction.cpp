#include "tests/rules/include_direction.hpp"

#include <algorithm>
#include <array>
#include <set>
#include <string>

namespace ringwright::rules {
namespace {

/// Height of a floor; tests and validation see every floor and are no floor themselves.
int height_of(const std::string& floor) {
  constexpr std::array floors = {"models", "solver", "postprocess", "cases"};
  return static_cast<int>(std::find(floors.begin(), floors.end(), floor) - floors.begin());
}

/// No floor sees the tests or the validation; the validation may use what the tests run with.
bool hidden(const std::string& to, const std::string& from) {
  return to == "validation" || (to == "tests" && from != "validation");
}

/// Depth-first walk that keeps the chain of files it came by.
class CycleSearch {
 public:
  explicit CycleSearch(const SourceTree& tree) : tree_(tree) {}

  std::vector<Violation> run() {
    for (const auto& [path, file] : tree_) visit(path);
    return found_;
  }

 private:
  void visit(const std::string& path) {
    if (done_.contains(path)) return;
    const auto start = std::find(chain_.begin(), chain_.end(), path);
    if (start != chain_.end()) {
      std::string message = "include cycle:";
      for (auto it = start; it != chain_.end(); ++it) message += " " + *it + " ->";
      found_.push_back({path, 0, message + " " + path});
      return;
    }
    chain_.push_back(path);
    for (const auto& include : tree_.at(path).includes) {
      if (tree_.contains(include.target)) visit(include.target);
    }
    chain_.pop_back();
    done_.insert(path);
  }

  const SourceTree& tree_;
  std::set<std::string> done_;
  std::vector<std::string> chain_;
  std::vector<Violation> found_;
};

}  // namespace

std::vector<Violation> upward_includes(const SourceTree& tree) {
  std::vector<Violation> found;
  for (const auto& [path, file] : tree) {
    const std::string from = floor_of(path);
    for (const auto& include : file.includes) {
      if (!tree.contains(include.target)) continue;
      const std::string to = floor_of(include.target);
      if (from == to) continue;
      if (hidden(to, from)) {
        found.push_back({path, include.line, from + " must not include " + to});
      } else if (height_of(to) > height_of(from)) {
        found.push_back({path, include.line, "upward include: " + from + " -> " + to});
      }
    }
  }
  return found;
}

std::vector<Violation> includes_not_from_root(const SourceTree& tree) {
  std::vector<Violation> found;
  for (const auto& [path, file] : tree) {
    for (const auto& include : file.includes) {
      if (include.angled || tree.contains(include.target)) continue;
      found.push_back({path, include.line,
                       "\"" + include.target + "\" is no file of ours written from the root"});
    }
  }
  return found;
}

std::vector<Violation> include_cycles(const SourceTree& tree) { return CycleSearch(tree).run(); }

}  // namespace ringwright::rules
