#pragma once
/// A command line run inside the test, its two streams kept apart, in a folder of its own.

#include <filesystem>
#include <fstream>
#include <iterator>
#include <random>
#include <sstream>
#include <string>
#include <vector>

#include "cases/command/run.hpp"

namespace ringwright::test {

struct Outcome {
  int code;
  std::string out, err;
};

inline Outcome run_command(const std::vector<std::string>& arguments) {
  std::ostringstream out, err;
  const int code = cases::run(arguments, {out, err});
  return {code, out.str(), err.str()};
}

/// An empty folder, removed at the end.
class TemporaryFolder {
 public:
  TemporaryFolder()
      : path_(std::filesystem::temp_directory_path() /
              ("ringwright-command-" + std::to_string(std::random_device{}()))) {
    std::filesystem::create_directories(path_);
  }
  TemporaryFolder(const TemporaryFolder&) = delete;
  TemporaryFolder& operator=(const TemporaryFolder&) = delete;
  ~TemporaryFolder() {
    std::error_code ignored;
    std::filesystem::remove_all(path_, ignored);
  }

  std::string operator/(const std::string& name) const { return (path_ / name).string(); }

  /// A file in it. @return its path
  std::string file(const std::string& name, const std::string& content) const {
    std::ofstream(path_ / name) << content;
    return *this / name;
  }

 private:
  std::filesystem::path path_;
};

inline std::string content_of(const std::filesystem::path& file) {
  std::ifstream stream(file, std::ios::binary);
  return {std::istreambuf_iterator<char>(stream), {}};
}

/// An invented test that is quickly computed.
inline std::string quick_case() {
  return "ringwright: 1\n"
         "ground:\n"
         "  texture: sandy loam, moist\n"
         "  published: Carsel & Parrish 1988\n"
         "  water: 10 degC\n"
         "tests:\n"
         "  one head: { ring: 12 in, insert: 4 in, head: 2 in }\n"
         "  stop: after 2 h\n"
         "  read: every 10 min\n";
}

}  // namespace ringwright::test
