#include "cases/command/case_file.hpp"

#include <fmt/format.h>

#include <cerrno>
#include <fstream>
#include <iterator>
#include <system_error>
#include <vector>

#include "cases/input/read_case.hpp"
#include "cases/input/suggestion.hpp"

namespace ringwright::cases {
namespace {

std::string content_of(const std::filesystem::path& file) {
  if (std::filesystem::is_directory(file)) {
    throw FileError(fmt::format("cannot read '{}': it is a folder", file.string()));
  }
  errno = 0;
  std::ifstream stream(file, std::ios::binary);
  std::string text;
  if (stream) text.assign(std::istreambuf_iterator<char>(stream), {});
  if (!stream.is_open() || stream.bad()) {
    const std::string reason = std::generic_category().message(errno == 0 ? EIO : errno);
    throw FileError(fmt::format("cannot read '{}': {}", file.string(), reason));
  }
  return text;
}

}  // namespace

Case load_case(const std::filesystem::path& file) { return read_case(content_of(file), file); }

Case with_one_test(Case what, const std::string& name) {
  std::vector<std::string> names;
  std::vector<Test> wanted;
  for (const Test& test : what.tests) {
    names.push_back(test.name);
    if (normalised(test.name) == normalised(name)) wanted.push_back(test);
  }
  if (wanted.empty()) {
    throw UsageError(fmt::format("no test '{}' in the case; {}", name, suggest(name, names)));
  }
  what.tests = std::move(wanted);
  return what;
}

}  // namespace ringwright::cases
