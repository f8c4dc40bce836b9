#include "tests/rules/header_fences.hpp"

#include <algorithm>
#include <array>
#include <string>
#include <string_view>

namespace ringwright::rules {
namespace {

using Names = std::vector<std::string_view>;

struct Fence {
  std::string_view library;
  Names headers;  ///< whole names, or beginnings that end in '/' or '_'
  Names folders;  ///< where they are allowed; tests and validation besides
};

const std::vector<Fence>& fences() {
  static const std::vector<Fence> all = {
      {"SUNDIALS",
       {"ida/", "idas/", "cvode/", "cvodes/", "arkode/", "kinsol/", "sundials/", "nvector/",
        "sunmatrix/", "sunlinsol/", "sunnonlinsol/"},
       {"solver/time/"}},
      {"KLU", {"klu.h", "suitesparse/", "amd.h", "btf.h", "colamd.h"}, {"solver/linear/"}},
      {"HDF5", {"hdf5.h", "hdf5_", "hdf5/", "H5"}, {"postprocess/results/"}},
      {"OpenSSL", {"openssl/"}, {"postprocess/results/"}},
      {"yaml-cpp", {"yaml-cpp/"}, {"cases/input/"}},
      {"udunits2", {"udunits2.h", "udunits2/", "udunits.h"}, {"cases/input/"}},
      {"CLI11", {"CLI/"}, {"cases/command/"}},
      {"nlohmann-json", {"nlohmann/"}, {"postprocess/results/", "cases/"}},
      {"fmt", {"fmt/"}, {"postprocess/", "cases/"}},
      {"Eigen", {"Eigen/", "unsupported/Eigen/"}, {"solver/", "postprocess/", "cases/"}},
      {"Boost", {"boost/"}, {"models/", "solver/", "postprocess/", "cases/"}},
      {"Catch2", {"catch2/"}, {}},
      {"the operating system",
       {"unistd.h", "fcntl.h", "signal.h", "termios.h", "poll.h", "sys/"},
       {"postprocess/", "cases/"}},
  };
  return all;
}

bool names(std::string_view pattern, std::string_view header) {
  const bool beginning = pattern.back() == '/' || pattern.back() == '_' || pattern == "H5";
  return beginning ? header.starts_with(pattern) : header == pattern;
}

const Fence* fence_of(std::string_view header) {
  for (const auto& fence : fences()) {
    for (const auto& pattern : fence.headers) {
      if (names(pattern, header)) return &fence;
    }
  }
  return nullptr;
}

bool in_tests(std::string_view path) {
  return path.starts_with("tests/") || path.starts_with("validation/");
}

bool allowed(const Fence& fence, std::string_view path) {
  if (in_tests(path)) return true;
  return std::any_of(fence.folders.begin(), fence.folders.end(),
                     [&](std::string_view folder) { return path.starts_with(folder); });
}

/// Headers of the C++ standard library have neither folder nor ending.
bool standard_cpp(std::string_view header) {
  return header.find_first_of("./") == std::string_view::npos;
}

}  // namespace

std::vector<Violation> broken_fences(const SourceTree& tree) {
  std::vector<Violation> found;
  for (const auto& [path, file] : tree) {
    for (const auto& [line, target, angled] : file.includes) {
      if (!angled && tree.contains(target)) continue;
      const Fence* fence = fence_of(target);
      if (fence != nullptr && !allowed(*fence, path)) {
        found.push_back(
            {path, line,
             "<" + target + ">: " + std::string(fence->library) + " is fenced out of this folder"});
      } else if (fence == nullptr && angled && !standard_cpp(target)) {
        found.push_back({path, line, "<" + target + ">: no fence names this header"});
      }
    }
  }
  return found;
}

std::vector<Violation> impure_floors(const SourceTree& tree) {
  constexpr std::array<std::string_view, 26> banned = {
      "chrono",    "ctime",      "thread",   "mutex",      "shared_mutex", "condition_variable",
      "future",    "stop_token", "barrier",  "latch",      "semaphore",    "fstream",
      "cstdio",    "filesystem", "iostream", "syncstream", "print",        "locale",
      "clocale",   "codecvt",    "csignal",  "stdio.h",    "time.h",       "locale.h",
      "pthread.h", "omp.h"};
  std::vector<Violation> found;
  for (const auto& [path, file] : tree) {
    const std::string floor = floor_of(path);
    if (floor != "models" && floor != "solver") continue;
    for (const auto& [line, target, angled] : file.includes) {
      if (angled && std::find(banned.begin(), banned.end(), target) != banned.end()) {
        found.push_back({path, line,
                         "<" + target + ">: " + floor +
                             " holds no clocks, threads, files, locale or printing"});
      }
    }
  }
  return found;
}

}  // namespace ringwright::rules
